import { AZEOTROPE_ROWS, AZEOTROPE_SOURCE, MAXIMUM_PAIRS, type AzeotropeRow } from './azeotrope-data';

export interface Azeotrope {
  casA: string;
  casB: string;
  /** Mass per cent of A in the distillate as a whole, both layers together. */
  massPercentA: number;
  massPercentB: number;
  /** At 101.3 kPa. The composition shifts with pressure. */
  boilingPointC: number;
  pressureKPa: number;
  kind: 'minimum' | 'maximum';
  /** The condensate parts into two layers, so that a separator can break the azeotrope. */
  twoLayers: boolean;
  source: string;
}

function fromRow([casA, casB, massPercentA, boilingPointC, layers]: AzeotropeRow): Azeotrope {
  return {
    casA,
    casB,
    massPercentA,
    massPercentB: Math.round((100 - massPercentA) * 10) / 10,
    boilingPointC,
    pressureKPa: 101.3,
    kind: MAXIMUM_PAIRS.has(`${casA} ${casB}`) ? 'maximum' : 'minimum',
    twoLayers: layers === 'two layers',
    source: AZEOTROPE_SOURCE,
  };
}

/** The same azeotrope told from the other component. */
function turned(azeotrope: Azeotrope): Azeotrope {
  const { casA, casB, massPercentA, massPercentB } = azeotrope;
  return { ...azeotrope, casA: casB, casB: casA, massPercentA: massPercentB, massPercentB: massPercentA };
}

/** All known binary azeotropes. */
export function listAzeotropes(): Azeotrope[] {
  return AZEOTROPE_ROWS.map(fromRow);
}

/**
 * Known azeotropes of one compound, told with it as A.
 * @param cas CAS number in its usual form.
 */
export function listAzeotropesOf(cas: string): Azeotrope[] {
  return listAzeotropes().flatMap((azeotrope) => {
    if (azeotrope.casA === cas) return [azeotrope];
    return azeotrope.casB === cas ? [turned(azeotrope)] : [];
  });
}

/**
 * Known azeotropes of two compounds, told in the order asked for. Empty where none is known, which is not a proof that
 * there is none.
 */
export function findAzeotropes(casA: string, casB: string): Azeotrope[] {
  return listAzeotropesOf(casA).filter((azeotrope) => azeotrope.casB === casB);
}
