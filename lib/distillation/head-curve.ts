export type CurveReading = { at: Date; headTemperatureC: number; volumeMl: number | null };
export type CurveFraction = { cut: string; collectedAt: Date; netMassG: number | null };
export type CurvePoint = { headTemperatureC: number; volumeMl?: number; collectedMassG?: number };

/** Receivers that take distillate one after the other; residue and trap do not. */
const distillateCuts = new Set(['fore-run', 'heart', 'tail']);

/**
 * The head temperature over what was collected. Where volumes were logged they place the points (mL).
 * Otherwise each receiver is taken to have filled evenly from when it was put on until the next one (or
 * the end of the run), which puts a reading at a collected mass (g); readings before the first receiver
 * lie at zero.
 */
export function headCurve(
  readings: readonly CurveReading[],
  fractions: readonly CurveFraction[],
  endedAt: Date | null,
): CurvePoint[] {
  const withVolume = readings.filter((reading) => reading.volumeMl !== null);
  if (withVolume.length >= 2) {
    return withVolume.map((r) => ({ headTemperatureC: r.headTemperatureC, volumeMl: r.volumeMl! }));
  }
  const receivers = fractions
    .filter((fraction) => distillateCuts.has(fraction.cut))
    .sort((a, b) => a.collectedAt.getTime() - b.collectedAt.getTime());
  const lastReading = readings.reduce((latest, r) => Math.max(latest, r.at.getTime()), 0);
  const end = endedAt?.getTime() ?? lastReading;
  return readings.map((reading) => ({
    headTemperatureC: reading.headTemperatureC,
    collectedMassG: collectedAtTime(reading.at.getTime(), receivers, end),
  }));
}

function collectedAtTime(time: number, receivers: readonly CurveFraction[], end: number): number {
  let collected = 0;
  for (const [at, receiver] of receivers.entries()) {
    const from = receiver.collectedAt.getTime();
    const to = receivers[at + 1]?.collectedAt.getTime() ?? Math.max(end, from);
    if (time <= from) break;
    const share = to > from ? Math.min(1, (time - from) / (to - from)) : 1;
    collected += share * (receiver.netMassG ?? 0);
  }
  return collected;
}
