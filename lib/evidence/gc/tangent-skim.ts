import { meanOf, type RunningSum } from './running-sum';

/**
 * The tail (or front) of a large peak under a small one, as a function of the point index. Levels are
 * above the baseline.
 */
export interface SkimLine {
  kind: 'exponential' | 'curved' | 'straight';
  at(index: number): number;
}

interface Level {
  index: number;
  level: number;
  /** Standard deviation of the level. */
  doubt: number;
  /** Logarithmic slope per point, or null where the level is too near the noise. */
  slope: number | null;
}

function levelOf(running: RunningSum, window: { from: number; to: number }, deviation: number): Level {
  const { from, to } = window;
  const length = to - from;
  const index = (from + to - 1) / 2;
  const plain = meanOf(running, from, to);
  const doubt = deviation / Math.sqrt(Math.max(1, length));
  const half = length >> 1;
  if (half < 1) return { index, level: plain, doubt, slope: null };
  const first = meanOf(running, from, from + half);
  const second = meanOf(running, to - half, to);
  if (Math.min(first, second) < (10 * deviation) / Math.sqrt(half))
    return { index, level: plain, doubt, slope: null };
  const slope = Math.log(second / first) / (length - half);
  // A mean over an exponential is above its middle by sinh(x)/x.
  const bow = (slope * length) / 2;
  const level = Math.abs(bow) < 1e-4 ? plain : (plain * bow) / Math.sinh(bow);
  return { index, level, doubt, slope };
}

/** Exponential through one level, if the tail or front it carries on does not rise over the other level. */
function carriedOn(near: Level, far: Level): SkimLine | null {
  if (near.slope === null) return null;
  const slope = near.slope;
  // Outwards from the carrier the tail must fall.
  if (slope * (far.index - near.index) >= 0) return null;
  const carried = near.level * Math.exp(slope * (far.index - near.index));
  if (carried > far.level + 3 * far.doubt) return null;
  if (far.slope !== null) {
    const ratio = far.slope / slope;
    const flatter = far.level - carried > 3 * far.doubt && ratio < 0.75;
    if (ratio > 1.3 || flatter) return null;
  }
  return { kind: 'exponential', at: (i) => near.level * Math.exp(slope * (i - near.index)) };
}

/** Between both levels: a cubic of the logarithm that keeps both slopes, a straight logarithm, or a straight line. */
function bridged(a: Level, b: Level): SkimLine {
  const distance = b.index - a.index;
  if (!(a.level > 4 * a.doubt) || !(b.level > 4 * b.doubt)) {
    const slope = (b.level - a.level) / distance;
    return { kind: 'straight', at: (index) => a.level + slope * (index - a.index) };
  }
  const la = Math.log(a.level);
  const lb = Math.log(b.level);
  const sa = a.slope ?? (lb - la) / distance;
  const sb = b.slope ?? (lb - la) / distance;
  const at = (i: number) => {
    const u = Math.min(1, Math.max(0, (i - a.index) / distance));
    const v = 1 - u;
    const straight = v * v * (1 + 2 * u) * la + u * u * (1 + 2 * v) * lb;
    return Math.exp(straight + u * v * (v * sa - u * sb) * distance);
  };
  return { kind: 'curved', at };
}

/**
 * Draws the skim line under a small peak between the tail before it and the tail after it. A tail that falls
 * exponentially is carried on from the carrier's side (the small peak's own tail then lies wholly above it); where the
 * trace after the small peak shows that it is not exponential, its logarithm is bridged by a cubic that
 * keeps both slopes; near the noise, by a straight line. Windows are points from..to, to not included.
 * Common practice (exponential skim); no pharmacopoeia fixes one.
 */
export function drawSkimLine(
  running: RunningSum,
  before: { from: number; to: number },
  after: { from: number; to: number },
  deviation: number,
): SkimLine {
  const a = levelOf(running, before, deviation);
  const b = levelOf(running, after, deviation);
  return (a.level > b.level ? carriedOn(a, b) : carriedOn(b, a)) ?? bridged(a, b);
}
