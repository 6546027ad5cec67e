import { requireFinite, requireNotNegative, requirePositive } from '@/lib/units/require-number';
import { requireIndex, USUAL_INDEX_FALL_PER_C, USUAL_INDEX_FALL_UNCERTAINTY_PER_C } from './correct-index';

/** One line of the budget, ready to be a row of a table. */
export type BudgetRow = {
  source: string;
  /** Type A from the replicates, type B from anything else (JCGM 100:2008, 4.2 and 4.3). */
  type: 'A' | 'B';
  distribution: 'normal' | 'rectangular';
  /** Standard uncertainty of the refractive index, k = 1. */
  standardUncertainty: number;
  basis: string;
};

export type IndexBudget = {
  count: number;
  meanN: number;
  /** Standard deviation of the readings; null for a single one. */
  standardDeviation: number | null;
  rows: BudgetRow[];
  combinedStandardUncertainty: number;
  /** U, k = 2. */
  expandedUncertainty: number;
  coverageFactor: 2;
  notes: string[];
};

export type BudgetInput = {
  readings: readonly number[];
  temperatureC: number;
  literatureTemperatureC: number;
  /** Smallest step that the instrument shows. Default 0.0001. */
  resolution?: number;
  /** Standard uncertainty of the sample's temperature, °C. Default 0.1 (common practice, circulated water). */
  temperatureUncertaintyC?: number;
  fallPerC?: number;
  /** Standard uncertainty of the fall per °C; half the last digit or less where the compound has its own. */
  fallUncertaintyPerC?: number;
  /** Half-width within which the literature value is believed. Default 0.0002 (common practice). */
  literatureHalfWidth?: number;
};

/** Mean and standard deviation (n - 1) of replicate readings. Throws a RangeError for none, or for a slip. */
export function replicateStatistics(readings: readonly number[]): {
  count: number;
  meanN: number;
  standardDeviation: number | null;
} {
  if (readings.length === 0) throw new RangeError('Enter at least one refractometer reading.');
  readings.forEach((n, i) => requireIndex(`Reading ${i + 1}`, n));
  const count = readings.length;
  const meanN = readings.reduce((sum, n) => sum + n, 0) / count;
  if (count === 1) return { count, meanN, standardDeviation: null };
  const squares = readings.reduce((sum, n) => sum + (n - meanN) ** 2, 0);
  return { count, meanN, standardDeviation: Math.sqrt(squares / (count - 1)) };
}

/**
 * Uncertainty of the difference between the corrected mean and the literature (JCGM 100:2008): repeatability,
 * resolution, temperature of the sample (u_T k), the coefficient over the correction (u_k |dT|), and the
 * literature value. U is twice the combined standard uncertainty.
 */
export function indexBudget(input: BudgetInput): IndexBudget {
  const { count, meanN, standardDeviation } = replicateStatistics(input.readings);
  const resolution = requirePositive('Resolution of the refractometer', input.resolution ?? 0.0001);
  const uTemperature = requireNotNegative(
    'Uncertainty of the temperature (°C)',
    input.temperatureUncertaintyC ?? 0.1,
  );
  const fall = requirePositive('Fall of the index per °C', input.fallPerC ?? USUAL_INDEX_FALL_PER_C);
  const uFall = requireNotNegative(
    'Uncertainty of the fall per °C',
    input.fallUncertaintyPerC ?? USUAL_INDEX_FALL_UNCERTAINTY_PER_C,
  );
  const halfWidth = requireNotNegative(
    'Half-width of the literature value',
    input.literatureHalfWidth ?? 0.0002,
  );
  const span = Math.abs(
    requireFinite('Temperature of the reading (°C)', input.temperatureC) -
      requireFinite('Temperature of the literature value (°C)', input.literatureTemperatureC),
  );
  const rows: BudgetRow[] = [];
  const add = (
    source: string,
    type: 'A' | 'B',
    distribution: 'normal' | 'rectangular',
    standardUncertainty: number,
    basis: string,
  ): void => void rows.push({ source, type, distribution, standardUncertainty, basis });
  if (standardDeviation !== null) {
    const basis = `standard deviation of ${count} readings over the root of ${count}`;
    add('repeatability', 'A', 'normal', standardDeviation / Math.sqrt(count), basis);
  }
  add(
    'resolution',
    'B',
    'rectangular',
    resolution / 2 / Math.sqrt(3),
    `half a step of ${resolution} over √3`,
  );
  add('temperature', 'B', 'normal', uTemperature * fall, `${uTemperature} °C times ${fall} per °C`);
  add('temperature coefficient', 'B', 'normal', uFall * span, `${uFall} per °C over ${span.toFixed(1)} °C`);
  add('literature', 'B', 'rectangular', halfWidth / Math.sqrt(3), `half-width ${halfWidth} over √3`);

  const combined = Math.sqrt(rows.reduce((sum, row) => sum + row.standardUncertainty ** 2, 0));
  const notes: string[] = [];
  if (count === 1)
    notes.push('A single reading says nothing about repeatability: read at least three times.');
  else if (count < 3) notes.push('Two readings estimate repeatability poorly: read at least three times.');
  return {
    count,
    meanN,
    standardDeviation,
    rows,
    combinedStandardUncertainty: combined,
    expandedUncertainty: 2 * combined,
    coverageFactor: 2,
    notes,
  };
}
