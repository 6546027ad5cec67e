import type { HeadPoint } from './cut-strip-layout';

export type EvidenceState = 'pass' | 'fail' | 'inconclusive' | 'blind' | 'missing';
export const EVIDENCE_KINDS = ['tlc', 'gc', 'refractiveIndex', 'boilingRange'] as const;
export type EvidenceKind = (typeof EVIDENCE_KINDS)[number];

/** Short names for the rows under the strip, and what they stand for. */
export const EVIDENCE_NAMES: Record<EvidenceKind, { short: string; full: string }> = {
  tlc: { short: 'TLC', full: 'Thin-layer chromatography' },
  gc: { short: 'GC', full: 'Gas chromatography' },
  refractiveIndex: { short: 'Index', full: 'Refractive index' },
  boilingRange: { short: 'Boiling', full: 'Boiling range' },
};

export type CutStripSegment = {
  code: string;
  number: number;
  /** A cut of marks.ts: fore-run, heart, tail, residue, trap. */
  cut: string;
  netMassG: number | null;
  headTemperatureFromC: number | null;
  headTemperatureToC: number | null;
  /** A fraction status of marks.ts. */
  status: string;
  /** A verdict of marks.ts; null before there is one. */
  verdict: string | null;
  evidence: Record<EvidenceKind, EvidenceState>;
  /** Where the segment leads; without it the segment is not a link. */
  href?: string;
};

export type CutStripProps = {
  segments: readonly CutStripSegment[];
  headCurve?: readonly HeadPoint[];
  /** At the pressure of the run. */
  expectedBoilingPointC?: number | null;
  /** The code of the fraction that the page is about. */
  current?: string;
  /** Names the picture: "Run D-2026-0042". */
  title?: string;
};
