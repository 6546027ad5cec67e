import { alongAt, chordSlope, inferDirection, polylineProblem, turnPoint } from './polyline';
import type { DevelopmentDirection, Point, Polyline } from './polyline';

export const RF_METHOD_VERSION = 'rf-1';

/** Standard uncertainty of placing a mark on the plate, mm (common practice). */
export const DEFAULT_MARK_UNCERTAINTY_MM = 0.5;
/** The same without a scale: 1 % of the developed distance, as 0.5 mm is on a usual 50 mm (common practice). */
export const DEFAULT_MARK_UNCERTAINTY_SHARE = 0.01;
/** Below this developed distance Rf is too coarse to rely on, mm (common practice). */
export const SHORTEST_DEVELOPMENT_MM = 20;

export type RfFlag =
  | 'perspective not corrected'
  | 'scale not known'
  | 'development under 20 mm'
  | 'little separated'
  | 'streak'
  | 'spot at the origin'
  | 'spot at the front';

/** Flags that speak of the photo rather than of one spot. */
export const flagsOfPhoto: readonly RfFlag[] = [
  'perspective not corrected',
  'scale not known',
  'development under 20 mm',
];

export type RfInput = {
  spot: Point;
  baseline: Polyline;
  front: Polyline;
  units: 'px' | 'mm';
  /**
   * 'auto' takes whichever way the front lies. Default: 'up' for px, so that swapped lines are refused and not
   * turned into 1 - Rf; 'auto' for mm, where y may have been measured from either edge.
   */
  direction?: DevelopmentDirection | 'auto';
  /** Millimetres in one unit; 1 for mm. Without it lengths in mm are not judged. */
  scaleMmPerUnit?: number;
  /** The marks were made on, or carried to, a photo freed of perspective. Default: only for mm. */
  perspectiveCorrected?: boolean;
  /** Size of the photo or plate in the same units: a spot off it is refused. */
  extent?: { width: number; height: number };
  shape?: 'spot' | 'streak';
  /** Standard uncertainties of the marks, in the units of the points. */
  uSpot?: number;
  uFront?: number;
  uBase?: number;
};

export type RfResult =
  | {
      ok: true;
      rf: number;
      /** Retardation factor times 100, as some journals print it. */
      hRf: number;
      /** Standard uncertainty (k = 1). */
      rfUncertainty: number;
      developedDistance: number;
      developedDistanceMm: number | null;
      flags: RfFlag[];
    }
  | { ok: false; field: 'spot' | 'baseline' | 'front' | 'scale'; problem: string };

/**
 * Retardation factor of one spot: Rf = (s - b)/(f - b), baseline and front taken at the spot's place across the
 * plate. Both are read straight up the image; for lines tilted alike (a plate photographed askew) the ratio is
 * the same along any direction, and the developed distance is reduced by the cosine of their mean tilt.
 *
 * u(Rf) = sqrt(u_s^2 + Rf^2 u_f^2 + (1 - Rf)^2 u_b^2)/(f - b), by propagation (JCGM 100:2008, 5.1.2).
 * A problem is returned, never thrown, since a user's marks cause it.
 */
export function computeRf(input: RfInput): RfResult {
  const drawn = checkMarks(input);
  if (drawn) return drawn;
  const wanted = input.direction ?? (input.units === 'mm' ? 'auto' : 'up');
  const direction = wanted === 'auto' ? inferDirection(input.baseline, input.front) : wanted;
  const turned = {
    spot: turnPoint(input.spot, direction),
    baseline: input.baseline.map((p) => turnPoint(p, direction)),
    front: input.front.map((p) => turnPoint(p, direction)),
  };
  const base = alongAt(turned.baseline, turned.spot.across);
  const front = alongAt(turned.front, turned.spot.across);
  if (base === null) return refuse('baseline', 'Draw the baseline across the lanes, not along them.');
  if (front === null) return refuse('front', 'Draw the solvent front across the lanes, not along them.');

  const tilt = (Math.atan(chordSlope(turned.baseline)) + Math.atan(chordSlope(turned.front))) / 2;
  const distance = (front - base) * Math.cos(tilt);
  if (!(distance > 1e-9)) {
    return refuse(
      'front',
      'The solvent front does not lie beyond the baseline at this lane: check that the two lines are not swapped, or turn the photo so that the solvent ran upwards.',
    );
  }
  const scale = input.units === 'mm' ? 1 : input.scaleMmPerUnit;
  const usual =
    scale === undefined ? DEFAULT_MARK_UNCERTAINTY_SHARE * distance : DEFAULT_MARK_UNCERTAINTY_MM / scale;
  const rf = (turned.spot.along - base) / (front - base);
  const rfUncertainty =
    Math.hypot(input.uSpot ?? usual, rf * (input.uFront ?? usual), (1 - rf) * (input.uBase ?? usual)) /
    distance;
  if (rf < -2 * rfUncertainty)
    return refuse('spot', 'The spot lies behind the baseline: mark its centre again.');
  if (rf > 1 + 2 * rfUncertainty)
    return refuse('spot', 'The spot lies beyond the solvent front: mark it again.');

  const developedDistanceMm = scale === undefined ? null : distance * scale;
  const flags = flagsOf(input, rf, rfUncertainty, developedDistanceMm);
  return {
    ok: true,
    rf,
    hRf: 100 * rf,
    rfUncertainty,
    developedDistance: distance,
    developedDistanceMm,
    flags,
  };
}

function refuse(field: 'spot' | 'baseline' | 'front' | 'scale', problem: string): RfResult & { ok: false } {
  return { ok: false, field, problem };
}

function checkMarks(input: RfInput): (RfResult & { ok: false }) | null {
  const { spot, extent } = input;
  if (!Number.isFinite(spot.x) || !Number.isFinite(spot.y)) {
    return refuse('spot', 'The spot has no position: mark its centre.');
  }
  if (extent && (spot.x < 0 || spot.y < 0 || spot.x > extent.width || spot.y > extent.height)) {
    return refuse('spot', 'The spot lies off the plate: mark its centre again.');
  }
  const baselineProblem = polylineProblem(input.baseline, 'baseline');
  if (baselineProblem) return refuse('baseline', baselineProblem);
  const frontProblem = polylineProblem(input.front, 'solvent front');
  if (frontProblem) return refuse('front', frontProblem);
  const scale = input.scaleMmPerUnit;
  if (scale !== undefined && !(Number.isFinite(scale) && scale > 0)) {
    return refuse('scale', 'The scale must be millimetres for one pixel, above zero.');
  }
  for (const u of [input.uSpot, input.uFront, input.uBase]) {
    if (u !== undefined && !(Number.isFinite(u) && u >= 0)) {
      return refuse('scale', 'The uncertainty of a mark must be a number that is not negative.');
    }
  }
  return null;
}

function flagsOf(input: RfInput, rf: number, rfUncertainty: number, developedMm: number | null): RfFlag[] {
  const flags: RfFlag[] = [];
  if (!(input.perspectiveCorrected ?? input.units === 'mm')) flags.push('perspective not corrected');
  if (developedMm === null) flags.push('scale not known');
  else if (developedMm < SHORTEST_DEVELOPMENT_MM) flags.push('development under 20 mm');
  if (rf < 0.1 || rf > 0.9) flags.push('little separated');
  if (input.shape === 'streak') flags.push('streak');
  if (rf <= 2 * rfUncertainty) flags.push('spot at the origin');
  if (rf >= 1 - 2 * rfUncertainty) flags.push('spot at the front');
  return flags;
}
