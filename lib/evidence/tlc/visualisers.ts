/** Groups in a structure that a visualiser answers to, found beforehand by whoever owns the structure library. */
export type StructureFeatures = {
  /** Aromatic ring or conjugated double bonds: a chromophore near 254 nm. */
  chromophore254: boolean;
  alkene: boolean;
  alkyne: boolean;
  alcohol: boolean;
  aldehyde: boolean;
  ketone: boolean;
  phenol: boolean;
  thiol: boolean;
  sulfide: boolean;
  primaryAmine: boolean;
  secondaryAmine: boolean;
  carboxylicAcid: boolean;
};

export type VisualiserId =
  | 'uv-254'
  | 'iodine'
  | 'permanganate'
  | 'p-anisaldehyde'
  | 'phosphomolybdic-acid'
  | 'dinitrophenylhydrazine'
  | 'ninhydrin'
  | 'bromocresol-green'
  | 'ferric-chloride';

export type Visualiser = {
  id: VisualiserId;
  name: string;
  /** Groups that it shows for certain. */
  shows: readonly (keyof StructureFeatures)[];
  /** What is to be expected of a compound with none of these groups. */
  otherwise: 'blind' | 'uncertain';
  basis: string;
};

const BASIS = 'common practice';

/** The visualisers and what they show. A new one is a new row here. */
export const VISUALISERS: readonly Visualiser[] = [
  { id: 'uv-254', name: 'UV 254 nm', shows: ['chromophore254'], otherwise: 'blind', basis: BASIS },
  {
    id: 'iodine',
    name: 'iodine vapour',
    shows: [
      'chromophore254',
      'alkene',
      'alkyne',
      'phenol',
      'thiol',
      'sulfide',
      'primaryAmine',
      'secondaryAmine',
    ],
    otherwise: 'uncertain',
    basis: BASIS,
  },
  {
    id: 'permanganate',
    name: 'potassium permanganate',
    shows: [
      'alkene',
      'alkyne',
      'alcohol',
      'aldehyde',
      'phenol',
      'thiol',
      'sulfide',
      'primaryAmine',
      'secondaryAmine',
    ],
    otherwise: 'blind',
    basis: BASIS,
  },
  {
    id: 'p-anisaldehyde',
    name: 'p-anisaldehyde',
    shows: ['alcohol', 'aldehyde', 'ketone', 'phenol', 'thiol', 'primaryAmine'],
    otherwise: 'uncertain',
    basis: BASIS,
  },
  {
    id: 'phosphomolybdic-acid',
    name: 'phosphomolybdic acid',
    shows: ['alkene', 'alcohol', 'aldehyde', 'phenol', 'thiol'],
    otherwise: 'uncertain',
    basis: BASIS,
  },
  {
    id: 'dinitrophenylhydrazine',
    name: '2,4-dinitrophenylhydrazine',
    shows: ['aldehyde', 'ketone'],
    otherwise: 'blind',
    basis: BASIS,
  },
  { id: 'ninhydrin', name: 'ninhydrin', shows: ['primaryAmine'], otherwise: 'blind', basis: BASIS },
  {
    id: 'bromocresol-green',
    name: 'bromocresol green',
    shows: ['carboxylicAcid'],
    otherwise: 'blind',
    basis: BASIS,
  },
  { id: 'ferric-chloride', name: 'ferric chloride', shows: ['phenol'], otherwise: 'blind', basis: BASIS },
];

/** The visualiser of an id, or null. */
export function findVisualiser(id: string): Visualiser | null {
  return VISUALISERS.find((v) => v.id === id) ?? null;
}

/** A compound boiling under this leaves the plate before it is seen, °C at 1 atm (common practice). */
export const EVAPORATES_BELOW_C = 150;

/** Whether a compound is likely gone from the plate before anyone looks. Throws a RangeError for no number. */
export function evaporatesFromPlate(normalBoilingPointC: number): boolean {
  if (!Number.isFinite(normalBoilingPointC))
    throw new RangeError('The boiling point must be a number in °C.');
  return normalBoilingPointC < EVAPORATES_BELOW_C;
}

const WORDS: Readonly<Record<keyof StructureFeatures, string>> = {
  chromophore254: 'a chromophore near 254 nm',
  alkene: 'a C=C double bond',
  alkyne: 'a triple bond',
  alcohol: 'an alcohol group',
  aldehyde: 'an aldehyde group',
  ketone: 'a ketone group',
  phenol: 'a phenol group',
  thiol: 'a thiol group',
  sulfide: 'a sulfide group',
  primaryAmine: 'a primary amine',
  secondaryAmine: 'a secondary amine',
  carboxylicAcid: 'a carboxylic acid group',
};

export type Visibility = { state: 'sees' | 'blind' | 'uncertain'; reason: string };

/**
 * Whether a visualiser shows a compound on the plate. Volatility is judged first: what has evaporated is seen by
 * nothing, and a blank lane then proves nothing about it. Without a structure (features null) the answer is
 * 'uncertain', and uncertain is never a proof.
 */
export function visibilityOnPlate(input: {
  visualiser: Visualiser;
  features: StructureFeatures | null;
  normalBoilingPointC: number | null;
}): Visibility {
  const { visualiser, features, normalBoilingPointC } = input;
  if (normalBoilingPointC !== null && evaporatesFromPlate(normalBoilingPointC)) {
    return {
      state: 'blind',
      reason: `It boils at ${normalBoilingPointC.toFixed(0)} °C and may leave the plate before it is seen (under ${EVAPORATES_BELOW_C} °C, common practice).`,
    };
  }
  if (!features)
    return { state: 'uncertain', reason: 'Its structure is not recorded: add a SMILES to the compound.' };
  const shown = visualiser.shows.find((group) => features[group]);
  if (shown)
    return { state: 'sees', reason: `${visualiser.name} shows ${WORDS[shown]} (${visualiser.basis}).` };
  const wanted = visualiser.shows.map((group) => WORDS[group]).join(', ');
  return visualiser.otherwise === 'blind'
    ? {
        state: 'blind',
        reason: `${visualiser.name} needs ${wanted}; the structure has none (${visualiser.basis}).`,
      }
    : {
        state: 'uncertain',
        reason: `${visualiser.name} shows many compounds, but nothing in this structure makes it sure: spot a reference beside it (${visualiser.basis}).`,
      };
}
