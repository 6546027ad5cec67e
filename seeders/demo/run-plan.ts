import type { Technique } from '@/lib/distillation/techniques';
import type { Cut } from '@/lib/distillation/fraction-states';

/** Mass per cent by CAS number. */
export type Composition = Readonly<Record<string, number>>;

/**
 * How far a fraction has come. `superseded`: signed off, and then read once more; `reopened`: signed off, and then
 * taken back by the PI with a reason.
 */
export type Standing = 'open' | 'submitted' | 'returned' | 'signed off' | 'superseded' | 'reopened';

export interface CutPlan {
  cut: Cut;
  massG: number;
  composition: Composition;
  standing?: Standing;
  /** Which measurements were made; none where it is left out. */
  trace?: 'FID' | 'TCD';
  index?: boolean;
  /** Whether its lane is on the plate of the run. */
  lane?: boolean;
  /** Head temperatures in °C where an azeotrope and not the components sets them. */
  headC?: readonly [number, number];
  appearance?: string;
  /** Why it was returned or reopened. */
  reason?: string;
}

export interface RunPlan {
  /** Kept as the lot of the charge, by which a run that was laid out before is found again. */
  lot: string;
  group: 'terpenes' | 'solvents';
  daysAgo: number;
  target: string;
  impurities: readonly string[];
  technique: Technique;
  pressureMbar: number;
  columnStages?: number;
  chargeMassG: number;
  chargeSource: string;
  crude: Composition;
  residueMassG?: number;
  note: string;
  visualisers: readonly ('uv-254' | 'permanganate')[];
  /** The distillation still runs. */
  running?: boolean;
  cuts: readonly CutPlan[];
}

/** Said wherever a demo record has room for words. */
export const INVENTED = 'Invented for the demo laboratory; no such measurement was made.';
