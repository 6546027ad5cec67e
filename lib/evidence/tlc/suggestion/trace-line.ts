import type { Raster } from './raster';

export type TracedLine = {
  /** Row of the line in each bin of columns. */
  rows: Float32Array;
  /** Strength of the line there, standard deviations. */
  strengths: Float32Array;
  /** Share of the bins in which the line is seen. */
  support: number;
};

/** What one place may add at most, nearly, so that a short strong stroke does not outweigh a long faint one. */
const MOST = 5;
/** Price of a step of one row from bin to bin. */
const STEP_PRICE = 0.35;
/** From this strength a place counts as seen. */
const SEEN = 2;

/**
 * The line from the left to the right side that gathers the most strength, allowed to climb or fall two rows from
 * bin to bin at a price (dynamic programming: R. Bellman, 1957). Tilted, curved and jagged lines are all the same
 * to it. Rows from `top` up to, not including, `bottom`.
 */
export function traceLine(strength: Raster, top: number, bottom: number): TracedLine {
  const bins = strength.width;
  const count = bottom - top;
  const gain = (bin: number, row: number) => {
    const here = strength.data[(top + row) * bins + bin]!;
    // Beyond the limit a little is still gained, so that the middle of a strong line beats its flanks.
    return here > MOST ? MOST + 0.5 * Math.log(here / MOST) : Math.max(-1, here);
  };
  let totals = Float32Array.from({ length: count }, (_, row) => gain(0, row));
  const from = new Int8Array(bins * count);
  for (let bin = 1; bin < bins; bin += 1) {
    const next = new Float32Array(count);
    for (let row = 0; row < count; row += 1) {
      let [best, move] = [totals[row]!, 0];
      for (let step = -2; step <= 2; step += 1) {
        const before = row + step;
        if (before < 0 || before >= count) continue;
        const total = totals[before]! - STEP_PRICE * Math.abs(step);
        if (total > best) [best, move] = [total, step];
      }
      next[row] = best + gain(bin, row);
      from[bin * count + row] = move;
    }
    totals = next;
  }
  let row = totals.indexOf(totals.reduce((best, v) => Math.max(best, v), -Infinity));
  const rows = new Float32Array(bins);
  const strengths = new Float32Array(bins);
  let seen = 0;
  for (let bin = bins - 1; bin >= 0; bin -= 1) {
    const at = (top + row) * bins + bin;
    const here = strength.data[at]!;
    const above = row > 0 ? strength.data[at - bins]! : here;
    const below = row < count - 1 ? strength.data[at + bins]! : here;
    const bend = above - 2 * here + below;
    const shift = bend < -1e-6 ? Math.max(-0.5, Math.min(0.5, (0.5 * (above - below)) / bend)) : 0;
    // Centres of pixels lie half a pixel below their upper edge.
    rows[bin] = top + row + 0.5 + shift;
    strengths[bin] = here;
    if (here >= SEEN) seen += 1;
    row += from[bin * count + row]!;
  }
  return { rows, strengths, support: seen / bins };
}
