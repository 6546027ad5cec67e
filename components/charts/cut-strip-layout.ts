/**
 * Where everything on a cut strip stands. Pure geometry in px; the drawing is in cut-strip.tsx.
 */
export type StripSegmentInput = {
  /** g; null while the receiver has not been weighed. */
  netMassG: number | null;
  headTemperatureFromC: number | null;
  headTemperatureToC: number | null;
};

/** One point of the head-temperature curve, against collected mass (g) or, where only that was logged, volume (mL). */
export type HeadPoint = {
  headTemperatureC: number;
  collectedMassG?: number | null;
  volumeMl?: number | null;
};

export type StripBox = { x: number; width: number };

/**
 * Widths of the segments, in order, without gaps. Proportional to mass, but none narrower than `minWidth`, so that a
 * thin cut can still be read and hit; what the thin ones take is taken from the wide ones in proportion. An unweighed
 * segment gets `minWidth`. When all minima together are wider than `available`, the strip is wider than its box.
 */
export function layoutSegments(
  massesG: readonly (number | null)[],
  available: number,
  minWidth: number,
): StripBox[] {
  const count = massesG.length;
  const mass = massesG.map((m) => (m !== null && Number.isFinite(m) && m > 0 ? m : 0));
  const widths = new Array<number>(count).fill(minWidth);
  const free = new Set(mass.map((_, at) => at).filter((at) => mass[at]! > 0));
  // Each round fixes at least one segment at the minimum, so it ends after `count` rounds at the latest.
  for (;;) {
    const room = available - minWidth * (count - free.size);
    const total = [...free].reduce((sum, at) => sum + mass[at]!, 0);
    const thin = [...free].filter((at) => (mass[at]! / total) * room < minWidth);
    if (thin.length === 0) {
      for (const at of free) widths[at] = (mass[at]! / total) * room;
      break;
    }
    thin.forEach((at) => free.delete(at));
  }
  let x = 0;
  return widths.map((width) => {
    const box = { x, width };
    x += width;
    return box;
  });
}

/**
 * Maps a collected mass (g, counted from the first receiver) to x, segment by segment: since thin segments are drawn
 * wider than their share, the axis is straight inside a segment only. Values beyond the last receiver stay at its end.
 */
export function massToX(
  collectedMassG: number,
  massesG: readonly (number | null)[],
  boxes: readonly StripBox[],
): number {
  let before = 0;
  for (let at = 0; at < boxes.length; at += 1) {
    const box = boxes[at]!;
    const mass = Math.max(0, massesG[at] ?? 0);
    if (collectedMassG <= before + mass && mass > 0)
      return box.x + (Math.max(0, collectedMassG - before) / mass) * box.width;
    before += mass;
  }
  const last = boxes.at(-1);
  return last ? last.x + last.width : 0;
}

/**
 * The head-temperature curve as points (x px, temperature °C), in the order of collection. A point with a mass is placed
 * by it; one with only a volume by its share of the largest volume, as if the density were the same all along.
 */
export function layoutCurve(
  points: readonly HeadPoint[],
  massesG: readonly (number | null)[],
  boxes: readonly StripBox[],
): { x: number; headTemperatureC: number }[] {
  const totalG = massesG.reduce<number>((sum, m) => sum + Math.max(0, m ?? 0), 0);
  const maxMl = Math.max(0, ...points.map((p) => p.volumeMl ?? 0));
  return points
    .map((point) => {
      const massG =
        point.collectedMassG ??
        (point.volumeMl != null && maxMl > 0 ? (point.volumeMl / maxMl) * totalG : null);
      return massG === null ? null : { massG, headTemperatureC: point.headTemperatureC };
    })
    .filter(
      (point) => point !== null && Number.isFinite(point.headTemperatureC) && Number.isFinite(point.massG),
    )
    .map((point) => point!)
    .sort((a, b) => a.massG - b.massG)
    .map(({ massG, headTemperatureC }) => ({ x: massToX(massG, massesG, boxes), headTemperatureC }));
}

/** The range of the temperature axis in °C, with room above and below; null when no temperature is known at all. */
export function temperatureRange(
  segments: readonly StripSegmentInput[],
  curve: readonly HeadPoint[],
  expectedC?: number | null,
): [number, number] | null {
  const all = [
    ...segments.flatMap((s) => [s.headTemperatureFromC, s.headTemperatureToC]),
    ...curve.map((p) => p.headTemperatureC),
    expectedC ?? null,
  ].filter((t): t is number => t !== null && Number.isFinite(t));
  if (all.length === 0) return null;
  const low = Math.min(...all);
  const high = Math.max(...all);
  // Never less than 4 °C in all: a plateau must not look like a mountain range.
  const pad = Math.max((high - low) * 0.12, (4 - (high - low)) / 2, 0.5);
  return [low - pad, high + pad];
}
