import { curvatureAt } from './curvature';
import { meanOf, type RunningSum } from './running-sum';

/** Lowest place between two tops, by means of `width` points; the level is the mean there. */
export function findValley(
  running: RunningSum,
  from: number,
  to: number,
  width: number,
): { index: number; level: number } {
  const half = Math.max(0, (width - 1) >> 1);
  const step = Math.max(1, width >> 2);
  let index = (from + to) >> 1;
  let level = Infinity;
  for (let i = from; i <= to; i += step) {
    const mean = meanOf(running, i - half, i + half + 1);
    if (mean < level) {
      level = mean;
      index = i;
    }
  }
  return { index, level };
}

/** Place of a split where there is no valley: where the trace is bent upwards most, between peak and shoulder. */
export function findBend(levels: Float64Array[], level: number, from: number, to: number): number {
  const points = levels[level]!;
  const size = 2 ** level;
  let index = (from + to) >> 1;
  let strongest = -Infinity;
  for (
    let i = Math.max(2, Math.ceil(from / size));
    i <= Math.min(points.length - 3, Math.floor(to / size));
    i++
  ) {
    const bend = curvatureAt(points, i);
    if (bend > strongest) {
      strongest = bend;
      index = i * size + (size >> 1);
    }
  }
  return Math.min(to, Math.max(from, index));
}
