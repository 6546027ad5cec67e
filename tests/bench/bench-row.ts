import type { Bench } from './bench';

/** One line of the table. Durations are said in words with their unit; `ratio` is measured ÷ baseline. */
export interface Figure {
  what: string;
  measured: string;
  baseline: string;
  /** Null when there was nothing to measure; `note` says why. */
  ratio: number | null;
  /** Lowest and highest ratio of single repetitions. */
  spread?: [number, number];
  /** What we aim at. It is printed beside the figure and never asserted: machines differ. */
  goal?: string;
  note?: string;
}

/** What a file under rows/ exports as `row`. */
export interface BenchRow {
  /** For `--only name`. */
  name: string;
  measure(bench: Bench): Promise<Figure[]>;
}
