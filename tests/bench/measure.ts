import { setImmediate as nextTurn } from 'node:timers/promises';

export type Contender = () => Promise<number | void> | number | void;

/** The middle value; the mean of the two middle ones for an even count. NaN for none. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}

/** The value that `share` (0 to 1) of the values do not exceed, by nearest rank. */
export function percentile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.max(0, Math.ceil(share * sorted.length) - 1)]!;
}

async function take(contender: Contender): Promise<number> {
  const started = performance.now();
  const own = await contender();
  return own ?? performance.now() - started;
}

export interface Comparison {
  measured: number;
  baseline: number;
  measuredAll: number[];
  ratio: number;
  spread: [number, number];
  repetitions: number;
}

/**
 * Runs a thing and its bare baseline in turns, each first in every other turn, so that a machine that grows busy
 * weighs on both alike. A contender gives its own figure, or its milliseconds are taken. Medians; the ratio is that
 * of the medians. No new turn begins after `budgetMs`.
 */
export async function compare(
  measured: Contender,
  baseline: Contender,
  {
    repetitions,
    warmUps = 1,
    budgetMs = 20_000,
  }: { repetitions: number; warmUps?: number; budgetMs?: number },
): Promise<Comparison> {
  const values: [number, number][] = [];
  const end = performance.now() + budgetMs;
  for (let turn = -warmUps; turn < repetitions; turn += 1) {
    if (values.length > 0 && performance.now() > end) break;
    // Contenders may be pure sums: between them signals and timers get their turn.
    await nextTurn();
    const pair: [number, number] = [0, 0];
    for (const index of turn % 2 === 0 ? ([0, 1] as const) : ([1, 0] as const)) {
      pair[index] = await take(index === 0 ? measured : baseline);
    }
    if (turn >= 0) values.push(pair);
  }
  const [ours, bare] = [values.map(([a]) => a), values.map(([, b]) => b)];
  const ratios = values.map(([a, b]) => a / b);
  return {
    measured: median(ours),
    baseline: median(bare),
    measuredAll: ours,
    ratio: median(ours) / median(bare),
    spread: [Math.min(...ratios), Math.max(...ratios)],
    repetitions: values.length,
  };
}

/** "0.83 ms", "12.4 ms", "1 240 ms". */
export function msText(ms: number): string {
  const digits = ms < 10 ? 2 : ms < 100 ? 1 : 0;
  return `${ms.toLocaleString('en', { minimumFractionDigits: digits, maximumFractionDigits: digits }).replace(/,/g, ' ')} ms`;
}
