import { requireFinite } from '@/lib/units/require-number';

/** A point on the photo (px) or the plate (mm); y grows downwards as on a screen. */
export type Point = { x: number; y: number };

/** A line drawn through 1 to 5 points; one point stands for a line straight across the plate. */
export type Polyline = readonly Point[];

/** Which way the solvent ran, as seen on the photo. */
export type DevelopmentDirection = 'up' | 'down' | 'left' | 'right';

/** A line turned so that `across` runs over the plate and `along` grows with the development. */
export type TurnedPoint = { across: number; along: number };

/** Turns the plane so that the development runs along growing `along`. */
export function turnPoint(point: Point, direction: DevelopmentDirection): TurnedPoint {
  requireFinite('x', point.x);
  requireFinite('y', point.y);
  switch (direction) {
    case 'up':
      return { across: point.x, along: -point.y };
    case 'down':
      return { across: point.x, along: point.y };
    case 'left':
      return { across: point.y, along: -point.x };
    case 'right':
      return { across: point.y, along: point.x };
  }
}

/** What is wrong with a drawn line, in words for the user, or null. */
export function polylineProblem(line: Polyline, name: string): string | null {
  if (line.length < 1 || line.length > 5)
    return `Draw the ${name} through 1 to 5 points, not ${line.length}.`;
  if (line.some((p) => !Number.isFinite(p.x) || !Number.isFinite(p.y))) {
    return `The ${name} has a point without a position: draw it again.`;
  }
  return null;
}

/**
 * Where a turned line lies at a place across the plate: straight between its points, its end pieces extended.
 * Null where two points lie one above the other, so that the line has no single place there.
 */
export function alongAt(points: readonly TurnedPoint[], across: number): number | null {
  const sorted = [...points].sort((a, b) => a.across - b.across);
  if (sorted.length === 1) return sorted[0]!.along;
  for (let i = 1; i < sorted.length; i += 1) {
    if (sorted[i]!.across - sorted[i - 1]!.across < 1e-9) return null;
  }
  let right = sorted.findIndex((p) => p.across >= across);
  if (right === -1) right = sorted.length - 1;
  right = Math.max(1, right);
  const a = sorted[right - 1]!;
  const b = sorted[right]!;
  return a.along + ((across - a.across) / (b.across - a.across)) * (b.along - a.along);
}

/** Slope of the chord from one end of a turned line to the other; 0 for a single point. */
export function chordSlope(points: readonly TurnedPoint[]): number {
  const sorted = [...points].sort((a, b) => a.across - b.across);
  const first = sorted[0]!;
  const last = sorted[sorted.length - 1]!;
  return last.across - first.across < 1e-9 ? 0 : (last.along - first.along) / (last.across - first.across);
}

/**
 * The direction in which the front lies from the baseline: up or down for lines drawn across the photo, left or
 * right for lines drawn down it. A guess to propose to the user, not to apply unseen, since swapped lines look
 * the same as a photo that stands on its head.
 */
export function inferDirection(baseline: Polyline, front: Polyline): DevelopmentDirection {
  const extent = (line: Polyline, key: 'x' | 'y'): number =>
    Math.max(...line.map((p) => p[key])) - Math.min(...line.map((p) => p[key]));
  const middle = (line: Polyline, key: 'x' | 'y'): number =>
    line.reduce((sum, p) => sum + p[key], 0) / line.length;
  const sideways = extent(baseline, 'y') + extent(front, 'y') > extent(baseline, 'x') + extent(front, 'x');
  if (sideways) return middle(front, 'x') < middle(baseline, 'x') ? 'left' : 'right';
  return middle(front, 'y') > middle(baseline, 'y') ? 'down' : 'up';
}
