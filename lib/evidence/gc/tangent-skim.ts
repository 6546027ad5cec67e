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
  /** Logarithmic slope per point, or null where the level is too near the noise. */
  slope: number | null;
}

function levelOf(running: RunningSum, from: number, to: number, deviation: number): Level {
  const length = to - from;
  const index = (from + to - 1) / 2;
  const plain = meanOf(running, from, to);
  const half = length >> 1;
  if (half < 1) return { index, level: plain, slope: null };
  const first = meanOf(running, from, from + half);
  const second = meanOf(running, to - half, to);
  const doubt = (deviation * Math.SQRT2) / Math.sqrt(half);
  if (Math.min(first, second) < 20 * doubt) return { index, level: plain, slope: null };
  const slope = Math.log(second / first) / (length - half);
  // A mean over an exponential is above its middle by sinh(x)/x.
  const bow = (slope * length) / 2;
  const level = Math.abs(bow) < 1e-4 ? plain : (plain * bow) / Math.sinh(bow);
  return { index, level, slope };
}

/**
 * Draws the skim line under a small peak between the tail before it and the tail after it. Where the logarithm of the
 * tail falls as fast after the small peak as before it, the tail is exponential and is carried on from before (the
 * small peak's own tail then lies wholly above it); where it does not, the logarithm is bridged by a cubic that
 * keeps both slopes; near the noise, by a straight line of the logarithm or of the signal itself.
 * Windows are points from..to, to not included. Common practice (exponential skim); no pharmacopoeia fixes one.
 */
export function drawSkimLine(
  running: RunningSum,
  before: { from: number; to: number },
  after: { from: number; to: number },
  deviation: number,
): SkimLine {
  const a = levelOf(running, before.from, before.to, deviation);
  const b = levelOf(running, after.from, after.to, deviation);
  const distance = b.index - a.index;
  const floor = 4 * deviation;
  if (!(a.level > floor / Math.sqrt(before.to - before.from)) || !(b.level > floor / Math.sqrt(after.to - after.from))) {
    const slope = (b.level - a.level) / distance;
    return { kind: 'straight', at: (index) => a.level + slope * (index - a.index) };
  }
  if (a.slope !== null && b.slope !== null) {
    const sa = a.slope;
    const sb = b.slope;
    if (sa < 0 && sb < 0 && Math.abs(sb - sa) < 0.12 * Math.abs(sa)) {
      const carried = a.level * Math.exp(sa * distance);
      if (carried <= b.level) return { kind: 'exponential', at: (i) => a.level * Math.exp(sa * (i - a.index)) };
    }
    if (sa > 0 && sb > 0 && Math.abs(sb - sa) < 0.12 * Math.abs(sb)) {
      const carried = b.level * Math.exp(-sb * distance);
      if (carried <= a.level) return { kind: 'exponential', at: (i) => b.level * Math.exp(sb * (i - b.index)) };
    }
    const la = Math.log(a.level);
    const lb = Math.log(b.level);
    const at = (i: number) => {
      const u = Math.min(1, Math.max(0, (i - a.index) / distance));
      const v = 1 - u;
      const straight = v * v * (1 + 2 * u) * la + u * u * (1 + 2 * v) * lb;
      return Math.exp(straight + u * v * (v * sa - u * sb) * distance);
    };
    return { kind: 'curved', at };
  }
  const slope = Math.log(b.level / a.level) / distance;
  return { kind: 'exponential', at: (i) => a.level * Math.exp(slope * (i - a.index)) };
}
