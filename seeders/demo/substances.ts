/** The liquids of the demo laboratory by CAS number. Retention times and Rf are invented, but in a believable order. */
export interface Substance {
  name: string;
  /** Peaks on the invented column: several for a mixture of isomers, with the share of each. */
  peaks: readonly { atMin: number; share: number }[];
  /** On silica with hexane and ethyl acetate 9:1 (invented); null: gone from the plate before it is seen. */
  rf: number | null;
  shownBy: readonly ('uv-254' | 'permanganate')[];
}

const one = (atMin: number) => [{ atMin, share: 1 }];

export const ETHANOL = '64-17-5';
export const WATER = '7732-18-5';
export const ETHYL_ACETATE = '141-78-6';
export const CYCLOHEXANONE = '108-94-1';
export const CYCLOHEXANOL = '108-93-0';
export const ALPHA_PINENE = '80-56-8';
export const MYRCENE = '123-35-3';
export const LIMONENE = '5989-27-5';
export const LINALOOL = '78-70-6';
export const CITRAL = '5392-40-5';
export const GERANIOL = '106-24-1';
export const BENZALDEHYDE = '100-52-7';
export const BENZYL_ALCOHOL = '100-51-6';

export const SUBSTANCES: Readonly<Record<string, Substance>> = {
  [WATER]: { name: 'water', peaks: one(1.2), rf: null, shownBy: [] },
  [ETHANOL]: { name: 'ethanol', peaks: one(1.9), rf: null, shownBy: [] },
  [ETHYL_ACETATE]: { name: 'ethyl acetate', peaks: one(2.9), rf: null, shownBy: [] },
  [CYCLOHEXANOL]: { name: 'cyclohexanol', peaks: one(6.0), rf: null, shownBy: [] },
  [CYCLOHEXANONE]: { name: 'cyclohexanone', peaks: one(6.4), rf: null, shownBy: [] },
  [ALPHA_PINENE]: { name: 'alpha-pinene', peaks: one(7.0), rf: 0.93, shownBy: ['permanganate'] },
  [BENZALDEHYDE]: { name: 'benzaldehyde', peaks: one(7.3), rf: 0.62, shownBy: ['uv-254', 'permanganate'] },
  [MYRCENE]: { name: 'myrcene', peaks: one(7.9), rf: 0.92, shownBy: ['permanganate'] },
  [LIMONENE]: { name: '(R)-limonene', peaks: one(8.6), rf: 0.91, shownBy: ['permanganate'] },
  [BENZYL_ALCOHOL]: {
    name: 'benzyl alcohol',
    peaks: one(8.9),
    rf: 0.18,
    shownBy: ['uv-254', 'permanganate'],
  },
  [LINALOOL]: { name: 'linalool', peaks: one(9.9), rf: 0.38, shownBy: ['permanganate'] },
  [GERANIOL]: { name: 'geraniol', peaks: one(12.34), rf: 0.22, shownBy: ['permanganate'] },
  [CITRAL]: {
    name: 'citral',
    peaks: [
      { atMin: 12.1, share: 0.4 },
      { atMin: 12.6, share: 0.6 },
    ],
    rf: 0.55,
    shownBy: ['uv-254', 'permanganate'],
  },
};

/** The substance of a CAS number. @throws Error for one that the demo laboratory does not have. */
export function requireSubstance(cas: string): Substance {
  const found = SUBSTANCES[cas];
  if (!found) throw new Error(`The demo laboratory has no ${cas}.`);
  return found;
}
