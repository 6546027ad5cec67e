import { findAzeotropes } from '@/lib/distillation/azeotropes';
import { boilingPointAtPressure } from '@/lib/distillation/boiling-point/boiling-point-at-pressure';
import { pressureForTemperature } from '@/lib/distillation/boiling-point/pressure-for-temperature';
import { judgeFractionBoilingRange, USUAL_BOILING_TOLERANCE_C } from '../fraction-boiling-range';
import type { CompoundFacts, CoverageCell, JudgeInputs } from '../judge-inputs';

const test = 'boiling range';
const NORMAL_PRESSURE_MBAR = 1013.25;

/**
 * Mole per cent of an impurity that moves the boiling point of the target by `byC`, both ideal (Raoult):
 * x = (P - Pt)/(Pi - Pt) with the vapour pressures at the moved temperature. Null where it moves it by no amount.
 */
export function molePercentThatMoves(
  target: CompoundFacts,
  compound: CompoundFacts,
  pressureMbar: number,
  byC: number,
): number | null {
  if (!target.vapourPressure || !compound.vapourPressure) return null;
  const targetC = boilingPointAtPressure(target.vapourPressure, pressureMbar).boilingPointC;
  const impurityC = boilingPointAtPressure(compound.vapourPressure, pressureMbar).boilingPointC;
  const at = targetC + Math.sign(impurityC - targetC) * byC;
  const ofTarget = pressureForTemperature(target.vapourPressure, at);
  const ofImpurity = pressureForTemperature(compound.vapourPressure, at);
  if (!ofTarget.ok || !ofImpurity.ok) return null;
  const share = (pressureMbar - ofTarget.pressureMbar) / (ofImpurity.pressureMbar - ofTarget.pressureMbar);
  return share > 0 && share < 1 ? 100 * share : null;
}

/** What the boiling range shows of a compound: close boilers and known azeotropes are not seen. */
export function boilingCell(compound: CompoundFacts, inputs: JudgeInputs): CoverageCell {
  const { target, head } = inputs;
  const limit = inputs.specification?.criteria.boilingRange ?? { toleranceC: USUAL_BOILING_TOLERANCE_C };
  const judged = judgeFractionBoilingRange(head, target, limit);
  const done = judged.state === 'judged';
  const answer = (sees: boolean, reason: string, limitPercent?: number): CoverageCell => {
    const share = limitPercent === undefined ? {} : { limitPercent };
    if (done) return { test, state: sees ? 'sees' : 'blind', ...share, reason };
    return {
      test,
      state: 'not done',
      wouldSee: sees,
      ...share,
      reason: `Not done; it would ${sees ? 'see it' : 'not help'}: ${reason}`,
    };
  };
  for (const one of [target, compound]) {
    if (!one.vapourPressure)
      return answer(false, `No literature value for the boiling point of ${one.name}.`);
  }
  const pressureMbar = head.pressureMbar ?? NORMAL_PRESSURE_MBAR;
  try {
    const ours = boilingPointAtPressure(target.vapourPressure!, pressureMbar);
    const its = boilingPointAtPressure(compound.vapourPressure!, pressureMbar);
    const apart = its.boilingPointC - ours.boilingPointC;
    const error = Math.hypot(limit.toleranceC, ours.uncertaintyC, its.uncertaintyC);
    const where = `${Math.abs(apart).toFixed(1)} °C ${apart < 0 ? 'below' : 'above'} the target at ${Number(pressureMbar.toPrecision(3))} mbar`;
    const [azeotrope] =
      target.casNumber && compound.casNumber ? findAzeotropes(target.casNumber, compound.casNumber) : [];
    if (azeotrope) {
      const mix = `it forms a known azeotrope with the target (${azeotrope.boilingPointC} °C, ${azeotrope.massPercentB} mass % of it; ${azeotrope.source})`;
      return answer(false, `It boils ${where}, but ${mix}.`);
    }
    if (Math.abs(apart) <= error)
      return answer(
        false,
        `It boils ${where}: within ±${error.toFixed(1)} °C of tolerance and method error.`,
      );
    const share = molePercentThatMoves(
      target,
      compound,
      pressureMbar,
      judged.state === 'judged' ? judged.result.effectiveToleranceC : error,
    );
    if (share === null)
      return answer(false, `It boils ${where}, but no amount of it moves the boiling point enough.`);
    return answer(
      true,
      `It boils ${where}; ${share.toPrecision(2)} mol % move the boiling point by the tolerance (Raoult, ideal).`,
      share,
    );
  } catch (error) {
    if (error instanceof RangeError) return answer(false, `It cannot be computed: ${error.message}`);
    throw error;
  }
}
