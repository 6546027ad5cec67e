import { chanceFor } from './random';
import type { Composition, RunPlan } from './run-plan';
import { requireSubstance } from './substances';

/** The photo, px: the plate fills it but for a margin. */
export const PHOTO = { widthPx: 900, heightPx: 1200, marginPx: 36, baselineY: 1040, frontY: 160 } as const;
export const PLATE_MM = { widthMm: 60, heightMm: 80 } as const;

export type DemoVisualiser = 'uv-254' | 'permanganate';

export type DemoSubject =
  { kind: 'crude' } | { kind: 'fraction'; number: number } | { kind: 'reference'; cas: string };

export interface DemoSpot {
  x: number;
  y: number;
  /** 0 to 1: how dark it is. */
  strength: number;
}

export interface DemoLane {
  label: string;
  x: number;
  subject: DemoSubject;
  composition: Composition;
}

/** A spot of less than this, mass %, is not seen by eye (common practice: a few per cent beside a heavy spot). */
const LEAST_VISIBLE_PERCENT = 1.5;
/** Spots closer than this in Rf run together. */
const MERGED_RF = 0.03;

/** Crude, the fractions that were spotted, and the pure target and first impurity beside them. */
export function lanesOf(plan: RunPlan): DemoLane[] {
  const lanes: Omit<DemoLane, 'x'>[] = [
    { label: 'crude', subject: { kind: 'crude' }, composition: plan.crude },
    ...plan.cuts.flatMap((cut, at) =>
      cut.lane
        ? [
            {
              label: `F${at + 1}`,
              subject: { kind: 'fraction' as const, number: at + 1 },
              composition: cut.composition,
            },
          ]
        : [],
    ),
    ...[plan.target, plan.impurities.at(-1)!].map((cas) => ({
      label: requireSubstance(cas).name,
      subject: { kind: 'reference' as const, cas },
      composition: { [cas]: 100 },
    })),
  ];
  const { widthPx, marginPx } = PHOTO;
  const step = (widthPx - 2 * marginPx) / (lanes.length + 1);
  return lanes.map((lane, at) => ({ ...lane, x: Math.round(marginPx + step * (at + 1)) }));
}

/** The spots of a lane under a visualiser, where they lie on the photo, px. */
export function spotsOf(plan: RunPlan, lane: DemoLane, visualiser: DemoVisualiser): DemoSpot[] {
  const chance = chanceFor(`plate ${plan.lot} ${lane.label}`);
  const { baselineY, frontY } = PHOTO;
  const found: { rf: number; percent: number }[] = [];
  for (const [cas, percent] of Object.entries(lane.composition)) {
    const { rf, shownBy } = requireSubstance(cas);
    if (rf === null || percent < LEAST_VISIBLE_PERCENT || !shownBy.includes(visualiser)) continue;
    const near = found.find((spot) => Math.abs(spot.rf - rf) < MERGED_RF);
    if (near) near.percent += percent;
    else found.push({ rf, percent });
  }
  return found.map(({ rf, percent }) => ({
    x: lane.x + Math.round(3 * chance.normal()),
    y: Math.round(baselineY - (rf + 0.004 * chance.normal()) * (baselineY - frontY)),
    strength: Math.min(1, 0.25 + 0.75 * Math.sqrt(percent / 100)),
  }));
}
