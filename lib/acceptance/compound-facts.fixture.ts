import type { CompoundFacts, JudgeInputs, TraceInput } from './judge-inputs';
import type { StructureFeatures } from '@/lib/evidence/tlc/visualisers';

const noGroups: StructureFeatures = {
  chromophore254: false,
  alkene: false,
  alkyne: false,
  alcohol: false,
  aldehyde: false,
  ketone: false,
  phenol: false,
  thiol: false,
  sulfide: false,
  primaryAmine: false,
  secondaryAmine: false,
  carboxylicAcid: false,
};

const source = 'CRC Handbook of Chemistry and Physics (from memory)';

/** A compound for tests: boiling point in °C at 1 atm, index at 20 °C for the sodium D line. */
export function facts(
  name: string,
  casNumber: string,
  boilsC: number | null,
  n20: number | null,
  groups: Partial<StructureFeatures> = {},
  associated = false,
): CompoundFacts {
  return {
    id: casNumber,
    name,
    casNumber,
    isWater: casNumber === '7732-18-5',
    plateFeatures: { ...noGroups, ...groups },
    normalBoilingPointC: boilsC,
    refractiveIndex: n20 === null ? null : { n: n20, temperatureC: 20, fallPerC: null, source },
    vapourPressure:
      boilsC === null
        ? null
        : { name, normalBoilingPointC: boilsC, normalBoilingPointSource: source, associated },
  };
}

// Boiling points and indices: CRC Handbook (from memory); water: Ph. Eur. 2.2.6.
export const ethylAcetate = facts('ethyl acetate', '141-78-6', 77.1, 1.3723);
export const ethanol = facts('ethanol', '64-17-5', 78.3, 1.3611, { alcohol: true }, true);
export const water = facts('water', '7732-18-5', 100, 1.333, {}, true);
export const toluene = facts('toluene', '108-88-3', 110.6, 1.4969, { chromophore254: true });
export const heptane = facts('heptane', '142-82-5', 98.4, 1.3878);
export const limonene = facts('limonene', '138-86-3', 176, 1.473, { alkene: true });
export const decane = facts('decane', '124-18-5', 174.2, 1.4119);
export const linalool = facts('linalool', '78-70-6', 198, 1.4627, { alkene: true, alcohol: true }, true);
export const pCymene = facts('p-cymene', '99-87-6', 177.1, 1.4909, { chromophore254: true });
export const benzaldehyde = facts('benzaldehyde', '100-52-7', 178.7, 1.5463, {
  chromophore254: true,
  aldehyde: true,
});
export const formicAcid = facts('formic acid', '64-18-6', 100.8, 1.3714, { carboxylicAcid: true }, true);

/** A trace of the fraction with a main peak of the target and one other; S/N grows with area. */
export function gcTrace(
  target: CompoundFacts,
  other: Partial<TraceInput['peaks'][number]> = {},
  detector = 'FID',
): TraceInput {
  const areaPercent = other.areaPercent ?? 0.2;
  return {
    traceId: 'trace',
    subject: 'fraction',
    detector,
    integrationNumber: 1,
    minimumAreaPercent: 0.01,
    minimumSignalToNoise: 3,
    disregardedPeakCount: 0,
    excluded: [],
    excludedPeaks: [],
    peaks: [
      {
        number: 1,
        retentionTimeMin: 5,
        widthHalfMin: 0.08,
        areaPercent: 100 - areaPercent,
        signalToNoise: 10_000,
        compoundId: target.id,
      },
      {
        number: 2,
        retentionTimeMin: 6,
        widthHalfMin: 0.08,
        areaPercent,
        signalToNoise: 100 * areaPercent,
        compoundId: null,
        ...other,
      },
    ],
  };
}

/** Nothing known but the compounds: no evidence, no specification. */
export function bare(target: CompoundFacts, ...knownImpurities: CompoundFacts[]): JudgeInputs {
  return {
    head: { fromC: null, toC: null, pressureMbar: null },
    target,
    knownImpurities,
    water,
    specification: null,
    traces: [],
    lanes: [],
    refractive: null,
  };
}

/** A reading that is as the literature says, with U 0.0002. */
export function readAs(target: CompoundFacts, difference = 0.0001): NonNullable<JudgeInputs['refractive']> {
  const n = target.refractiveIndex?.n ?? 1.4;
  return {
    readingId: 'reading',
    wavelengthNm: 589.3,
    waterReading: null,
    waterTemperatureC: null,
    comparison: {
      correctedN: n + difference,
      atTemperatureC: 20,
      literatureN: n,
      difference,
      expandedUncertainty: 0.0002,
      source,
    },
  };
}

/** One photo of the fraction's lane with one spot at Rf 0.5. */
export function photoUnder(visualiserId: string): JudgeInputs['lanes'][number] {
  return {
    plateId: 'plate',
    photoId: visualiserId,
    visualiserId,
    laneLabel: 'F',
    spots: [{ rf: 0.5, rfUncertainty: 0.012, flags: [] }],
    references: [],
  };
}
