import { findVisualiser, VISUALISERS, type Visualiser } from '@/lib/evidence/tlc/visualisers';
import { boilingCell } from './coverage/boiling-cell';
import { gcCell, gcNotDone } from './coverage/gc-cell';
import { refractiveCell } from './coverage/refractive-cell';
import { tlcCell, tlcNotDone } from './coverage/tlc-cell';
import { integratedTraces } from './criteria/gc-main-peak';
import type { CompoundFacts, CoverageCell, CoverageRow, JudgeInputs } from './judge-inputs';

/** Of several cells of one test the best: one plate that shows the compound is enough. */
function bestOfEachTest(cells: CoverageCell[]): CoverageCell[] {
  const best = new Map<string, CoverageCell>();
  for (const cell of cells) {
    const known = best.get(cell.test);
    const better =
      !known ||
      (cell.state === 'sees' && known.state !== 'sees') ||
      (cell.state === 'sees' && (cell.limitPercent ?? 100) < (known.limitPercent ?? 100));
    if (better) best.set(cell.test, cell);
  }
  return [...best.values()];
}

/** Visualisers that were not used, but are asked for; without any plate the plainest, UV 254 nm. */
function visualisersNotUsed(inputs: JudgeInputs): Visualiser[] {
  const used = new Set(inputs.lanes.map((lane) => lane.visualiserId));
  const asked = inputs.specification?.criteria.tlcCleanUnder ?? [];
  const wanted = used.size === 0 && asked.length === 0 ? ['uv-254'] : asked;
  return [...new Set(wanted)].flatMap((id) => (used.has(id) ? [] : (findVisualiser(id) ?? [])));
}

/** Names the tests that would close the hole: those of the row first, then any visualiser or detector. */
function adviceFor(compound: CompoundFacts, cells: CoverageCell[], inputs: JudgeInputs): string {
  const listed = cells.filter((cell) => cell.wouldSee);
  const further = [
    ...VISUALISERS.map((visualiser) => tlcNotDone(visualiser, compound)),
    ...['FID', 'TCD'].map((detector) => gcNotDone(detector, compound)),
  ].filter((cell) => cell.wouldSee && !cells.some((known) => known.test === cell.test));
  const names = [...listed, ...further].map((cell) => cell.test).slice(0, 3);
  return names.length > 0
    ? `To see ${compound.name}: ${names.join(', or ')}.`
    : `No test that Heartcut knows would see ${compound.name} beside ${inputs.target.name}: add the literature values that are missing, or document another method.`;
}

function buildRow(compound: CompoundFacts, decides: boolean, inputs: JudgeInputs): CoverageRow {
  const traces = integratedTraces(inputs.traces);
  const tests = bestOfEachTest([
    ...inputs.lanes.map((lane) => tlcCell(lane, compound)),
    ...visualisersNotUsed(inputs).map((visualiser) => tlcNotDone(visualiser, compound)),
    ...traces.map((trace) => gcCell(trace, compound, inputs)),
    ...(traces.length === 0 ? [gcNotDone('FID', compound)] : []),
    refractiveCell(compound, inputs),
    boilingCell(compound, inputs),
  ]);
  const seen = tests.some((cell) => cell.state === 'sees');
  return {
    compound: compound.name,
    decides,
    seen,
    tests,
    advice: seen ? null : adviceFor(compound, tests, inputs),
  };
}

/**
 * The coverage matrix: each known impurity, and water, against each test, computed from structure, literature
 * values, detector and noise. Water decides on the verdict where it is a known impurity of the run or the
 * specification limits it; otherwise its row only tells.
 */
export function buildCoverage(inputs: JudgeInputs): CoverageRow[] {
  const others = inputs.knownImpurities.filter(
    (compound) => !compound.isWater && compound.id !== inputs.target.id,
  );
  const waterDecides =
    inputs.knownImpurities.some((compound) => compound.isWater) ||
    inputs.specification?.criteria.waterMaxPercent !== undefined;
  const rows = others.map((compound) => buildRow(compound, true, inputs));
  return inputs.target.isWater ? rows : [...rows, buildRow(inputs.water, waterDecides, inputs)];
}
