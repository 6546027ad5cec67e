import type { VapourPressureData } from '@/lib/distillation/boiling-point/vapour-pressure-data';
import type { StructureFeatures } from '@/lib/evidence/tlc/visualisers';
import type { Criteria } from './criteria/registry';

/** What the rules need to know of one compound. Null means: no literature value is kept. */
export type CompoundFacts = {
  id: string;
  name: string;
  casNumber: string | null;
  isWater: boolean;
  /** Groups that visualisers answer to; null without a structure. */
  plateFeatures: StructureFeatures | null;
  normalBoilingPointC: number | null;
  refractiveIndex: { n: number; temperatureC: number; fallPerC: number | null; source: string } | null;
  vapourPressure: VapourPressureData | null;
};

export type PeakInput = {
  number: number;
  retentionTimeMin: number;
  widthHalfMin: number | null;
  areaPercent: number;
  signalToNoise: number | null;
  compoundId: string | null;
};

/** A trace with its integration in force. Only `subject: 'fraction'` traces belong to the fraction itself. */
export type TraceInput = {
  traceId: string;
  subject: 'fraction' | 'crude' | 'blank' | 'reference';
  detector: string;
  integrationNumber: number | null;
  /** Parameters of the integration that decide what is listed: disregard limit in area %, smallest S/N. */
  minimumAreaPercent: number;
  minimumSignalToNoise: number;
  /** Peaks under the disregard limit: found, neither listed nor in the sum. */
  disregardedPeakCount: number;
  excluded: { fromMin: number; toMin: number; reason: string }[];
  /** Peaks found in the excluded ranges. */
  excludedPeaks: { retentionTimeMin: number; area: number }[];
  peaks: PeakInput[];
};

export type SpotInput = { rf: number; rfUncertainty: number; flags: string[] };

/** The fraction's lane as one photo shows it, with the reference lanes of compounds beside it. */
export type LaneInput = {
  plateId: string;
  photoId: string;
  visualiserId: string;
  laneLabel: string;
  spots: SpotInput[];
  references: { compoundId: string; spots: SpotInput[] }[];
  /**
   * Spots of this lane that other photos of the plate show and this one does not: what two photos show at the same
   * place is one spot, and is not among them.
   */
  elsewhere?: { rf: number; visualiserIds: string[]; perspectiveCorrected: boolean }[];
};

export type RefractiveInput = {
  readingId: string;
  wavelengthNm: number;
  waterReading: number | null;
  waterTemperatureC: number | null;
  /** Null where there was no literature value to compare with. */
  comparison: {
    correctedN: number;
    atTemperatureC: number;
    literatureN: number;
    difference: number;
    expandedUncertainty: number;
    source: string;
  } | null;
};

export type SpecificationInput = {
  id: string;
  grade: string;
  edition: number;
  decisionRule: 'simple' | 'guarded';
  criteria: Criteria;
};

/** Everything that a verdict depends on, as plain values: the same inputs give the same verdict. */
export type JudgeInputs = {
  head: { fromC: number | null; toC: number | null; pressureMbar: number | null };
  target: CompoundFacts;
  knownImpurities: CompoundFacts[];
  water: CompoundFacts;
  specification: SpecificationInput | null;
  /** Of the fraction, and of the run's crude and references (for retention times). */
  traces: TraceInput[];
  lanes: LaneInput[];
  /** The latest reading; the earlier ones, the newest first, decide too. */
  refractive: RefractiveInput | null;
  earlierRefractive?: RefractiveInput[];
};

export type CriterionState = 'pass' | 'fail' | 'inconclusive' | 'blind' | 'missing';

/** One line of the verdict. Measured, limit and uncertainty are texts with their units. */
export type CriterionResult = {
  name: string;
  state: CriterionState;
  measured: string | null;
  limit: string | null;
  uncertainty: string | null;
  reason: string;
  source: string;
};

export type CoverageCell = {
  test: string;
  state: 'sees' | 'blind' | 'not done';
  limitPercent?: number;
  reason: string;
  /** For a test that was not done: whether it would see the compound. */
  wouldSee?: boolean;
};

export type CoverageRow = {
  compound: string;
  /** A known impurity decides on the verdict; water is shown always, and decides where it is one. */
  decides: boolean;
  seen: boolean;
  tests: CoverageCell[];
  /** What would close the hole, where nothing that was done sees the compound. */
  advice: string | null;
};

export type VerdictState = 'pass' | 'fail' | 'inconclusive' | 'blind' | 'incomplete';
