import { z } from 'zod';
import { isSodiumD } from '@/lib/evidence/refractive-index/correct-index';
import { decideDifference } from '@/lib/evidence/refractive-index/decide';
import { checkWater } from '@/lib/evidence/refractive-index/water-check';
import type { CriterionResult, RefractiveInput, SpecificationInput } from '../judge-inputs';
import { decidingReading, type JudgedReading } from './deciding-reading';
import { criterion } from './kind';

/** Why a reading may not be compared at all, or null: wrong light, or an instrument that is off. */
function whyNotComparable(reading: RefractiveInput): string | null {
  if (!isSodiumD(reading.wavelengthNm))
    return `Read at ${reading.wavelengthNm} nm: only the sodium D line can be compared. Read again at 589.3 nm.`;
  if (reading.waterReading === null || reading.waterTemperatureC === null) return null;
  try {
    const check = checkWater({ reading: reading.waterReading, temperatureC: reading.waterTemperatureC });
    return check.state === 'inconclusive' ? check.reason : null;
  } catch (error) {
    return error instanceof RangeError ? `The water check cannot be used: ${error.message}` : null;
  }
}

type Asked = { tolerance: number; rule: SpecificationInput['decisionRule']; targetName: string };

function judgeReading(reading: RefractiveInput, { tolerance, rule, targetName }: Asked): JudgedReading {
  const base = {
    name: 'Refractive index',
    measured: null,
    limit: `within ${tolerance} of the literature`,
    uncertainty: null,
    source: 'JCGM 106:2012',
  };
  const { comparison } = reading;
  if (!comparison) {
    const reason = `No literature value of the refractive index of ${targetName} to compare with. A PI can add one to the compound.`;
    return { hindered: true, expandedUncertainty: null, result: { ...base, state: 'missing', reason } };
  }
  const { difference, expandedUncertainty } = comparison;
  const facts = {
    ...base,
    measured: `n ${comparison.correctedN.toFixed(4)} at ${comparison.atTemperatureC.toFixed(1)} °C, ${difference < 0 ? '−' : '+'}${Math.abs(difference).toFixed(4)}`,
    uncertainty: `± ${expandedUncertainty.toFixed(5)}`,
    source: `literature ${comparison.literatureN.toFixed(4)}: ${comparison.source}; decision JCGM 106:2012`,
  };
  const hindrance = whyNotComparable(reading);
  const result: CriterionResult = hindrance
    ? { ...facts, state: 'inconclusive', reason: hindrance }
    : { ...facts, ...decideDifference({ difference, expandedUncertainty, tolerance, rule }) };
  return { hindered: hindrance !== null, expandedUncertainty, result };
}

export const refractiveIndex = criterion({
  name: 'Refractive index',
  schema: z.number().gt(0).max(0.05).describe('largest difference of n from the literature'),
  evaluate(inputs, tolerance, rule) {
    if (!inputs.refractive) {
      const reason = 'No refractometer reading of this fraction. Read it at least three times.';
      const limit = `within ${tolerance} of the literature`;
      const none = { measured: null, limit, uncertainty: null, source: 'JCGM 106:2012' };
      return [{ ...none, name: 'Refractive index', state: 'missing', reason }];
    }
    const asked = { tolerance, rule, targetName: inputs.target.name };
    const readings = [inputs.refractive, ...(inputs.earlierRefractive ?? [])];
    return [decidingReading(readings.map((reading) => judgeReading(reading, asked)))];
  },
});
