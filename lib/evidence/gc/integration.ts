/** Flags on one peak. The words are shown to people as they stand. */
export type PeakFlag =
  | 'shoulder'
  | 'tangent skimmed'
  | 'carries skimmed peaks'
  | 'not separated from the peak before'
  | 'not separated from the peak after'
  | 'detector saturated'
  | 'cut at the start of the trace'
  | 'cut at the end of the trace'
  | 'few points'
  | 'under the quantitation limit';

/**
 * One peak. Area is signal x minutes (detector unit times min), heights are in the unit of the signal.
 * A figure that cannot be measured (a peak cut off, a shoulder without its half height) is null.
 */
export interface Peak {
  number: number;
  retentionTimeMin: number;
  startMin: number;
  endMin: number;
  area: number;
  areaPercent: number;
  height: number;
  widthHalfMin: number | null;
  tailing: number | null;
  plates: number | null;
  resolution: number | null;
  signalToNoise: number;
  flags: PeakFlag[];
}

/** A stretch that goes significantly under the baseline; never part of the sum. */
export interface NegativeDip {
  startMin: number;
  endMin: number;
  lowestMin: number;
  depth: number;
  area: number;
}

/** A peak whose apex lies in an excluded range: measured, listed, not counted. */
export interface ExcludedPeak {
  retentionTimeMin: number;
  area: number;
  height: number;
  reason: string;
}

/** Noise of the trace, in the unit of the signal. `peakToPeak` is the h of S/N = 2H/h. */
export interface TraceNoise {
  standardDeviation: number;
  peakToPeak: number;
  quantisationStep: number | null;
  method: string;
}

/** Corners of the baseline: straight lines between them, level beyond the first and the last. */
export interface BaselineSegments {
  timeMin: number[];
  signal: number[];
}

export interface Integration {
  methodVersion: string;
  noise: TraceNoise;
  flags: string[];
  peaks: Peak[];
  totalArea: number;
  excludedPeaks: ExcludedPeak[];
  negativeDips: NegativeDip[];
  disregardedPeakCount: number;
  baseline: BaselineSegments;
}

/** A trace that cannot be integrated as it is; the message says what to do. */
export class TraceProblem extends Error {
  constructor(
    message: string,
    readonly pointIndex: number | null = null,
  ) {
    super(message);
    this.name = 'TraceProblem';
  }
}
