import { compareRf, type RfValue } from './agree';
import { type ComparedLane, laneWords } from './compare-lanes';
import { findVisualiser, type StructureFeatures, visibilityOnPlate } from './visualisers';

/** What must be known of a compound to say whether it could have been seen. */
export type PlateCompound = {
  id: string;
  name: string;
  isTarget: boolean;
  features: StructureFeatures | null;
  normalBoilingPointC: number | null;
};

export type Unseeable = {
  compound: { id: string; name: string };
  isTarget: boolean;
  state: 'blind' | 'uncertain';
  reason: string;
};

export type BeforeAfter = {
  crude: { laneId: string; label: string };
  fraction: { laneId: string; label: string; code: string | null };
  /** Indices of the crude lane's spots without, and of its spots with, a partner in the fraction. */
  disappeared: { spotIndex: number; rf: number }[];
  stayed: { crudeSpotIndex: number; fractionSpotIndex: number; rf: number }[];
  appeared: { spotIndex: number; rf: number }[];
  /** Target and known impurities that this visualiser could not, or not surely, have shown. */
  notSeeable: Unseeable[];
  words: string[];
};

/** Pairs of spots at the same place, nearest first, each spot once. */
function pair(crude: readonly RfValue[], fraction: readonly RfValue[]): BeforeAfter['stayed'] {
  const candidates = crude
    .flatMap((one, c) =>
      fraction.map((other, f) => ({ c, f, rf: other.rf, agreement: compareRf(one, other, true) })),
    )
    .filter((one) => one.agreement.state === 'agree')
    .sort((a, b) => Math.abs(a.agreement.difference) - Math.abs(b.agreement.difference));
  const stayed: BeforeAfter['stayed'] = [];
  for (const { c, f, rf } of candidates) {
    if (stayed.some((one) => one.crudeSpotIndex === c || one.fractionSpotIndex === f)) continue;
    stayed.push({ crudeSpotIndex: c, fractionSpotIndex: f, rf });
  }
  return stayed.sort((a, b) => a.rf - b.rf);
}

/** The compounds that a visualiser cannot or not surely show, with the reason. Volatility unknown counts as unsure. */
export function listUnseeable(visualiserId: string, compounds: readonly PlateCompound[]): Unseeable[] {
  const visualiser = findVisualiser(visualiserId);
  return compounds.flatMap((compound): Unseeable[] => {
    const { id, name, isTarget, features, normalBoilingPointC } = compound;
    const say = (state: Unseeable['state'], reason: string) => [
      { compound: { id, name }, isTarget, state, reason },
    ];
    if (!visualiser) return say('uncertain', `What "${visualiserId}" shows is not known here.`);
    const sight = visibilityOnPlate({ visualiser, features, normalBoilingPointC });
    if (sight.state !== 'sees') return say(sight.state, sight.reason);
    return normalBoilingPointC === null
      ? say(
          'uncertain',
          'No literature value of its boiling point: it may have left the plate before it was seen.',
        )
      : [];
  });
}

const places = (spots: readonly { rf: number }[]) => spots.map((spot) => spot.rf.toFixed(2)).join(', ');
const word = (count: number) => (count === 1 ? 'spot' : 'spots');

function wordsFor(
  result: Omit<BeforeAfter, 'words'>,
  crude: ComparedLane,
  fraction: ComparedLane,
  under: string,
): string[] {
  const { disappeared, stayed, appeared, notSeeable } = result;
  const words: string[] = [];
  if (crude.spots.length === 0)
    words.push(
      `The crude in ${laneWords(crude)} shows nothing under ${under}: nothing can be said to have disappeared.`,
    );
  if (disappeared.length > 0)
    words.push(
      `Disappeared from the crude to ${laneWords(fraction)} under ${under}: the ${word(disappeared.length)} at Rf ${places(disappeared)}. Gone means fainter than this visualiser shows, not absent.`,
    );
  else if (crude.spots.length > 0) words.push(`No spot of the crude disappeared in ${laneWords(fraction)}.`);
  if (stayed.length > 0)
    words.push(`Stayed in ${laneWords(fraction)}: the ${word(stayed.length)} at Rf ${places(stayed)}.`);
  if (appeared.length > 0)
    words.push(
      `New in ${laneWords(fraction)}, not seen in the crude: the ${word(appeared.length)} at Rf ${places(appeared)}. It formed during distillation, or the crude was too thin to show it.`,
    );
  for (const { compound, state, reason } of notSeeable)
    words.push(
      `${compound.name} ${state === 'blind' ? 'could not' : 'could not surely'} have been seen under ${under}: ${reason}`,
    );
  return words;
}

/**
 * Crude against fraction in one photo of one plate, for every pair of an undiluted crude lane and a fraction lane:
 * what disappeared, what stayed, what is new, and which of the run's compounds the visualiser could not have shown.
 */
export function compareBeforeAfter(
  lanes: readonly ComparedLane[],
  visualiserId: string,
  compounds: readonly PlateCompound[],
): BeforeAfter[] {
  const undiluted = (lane: ComparedLane) => !lane.dilutionPercent || lane.dilutionPercent >= 100;
  const crudes = lanes.filter((lane) => lane.subject.kind === 'crude' && undiluted(lane));
  const fractions = lanes.filter((lane) => lane.subject.kind === 'fraction');
  const under = findVisualiser(visualiserId)?.name ?? visualiserId;
  // A reference that shows its spot in this photo proves more than a rule does.
  const shown = new Set(
    lanes.flatMap(({ subject, spots }) =>
      subject.kind === 'reference' && subject.compound && spots.length > 0 ? [subject.compound.id] : [],
    ),
  );
  const notSeeable = listUnseeable(
    visualiserId,
    compounds.filter((compound) => !shown.has(compound.id)),
  );
  return crudes.flatMap((crude) =>
    fractions.map((fraction): BeforeAfter => {
      const stayed = pair(crude.spots, fraction.spots);
      const rest = (lane: ComparedLane, key: 'crudeSpotIndex' | 'fractionSpotIndex') =>
        lane.spots.flatMap(({ rf }, spotIndex) =>
          stayed.some((one) => one[key] === spotIndex) ? [] : [{ spotIndex, rf }],
        );
      const result = {
        crude: { laneId: crude.id, label: crude.label },
        fraction: { laneId: fraction.id, label: fraction.label, code: fraction.subject.code ?? null },
        disappeared: rest(crude, 'crudeSpotIndex'),
        stayed,
        appeared: rest(fraction, 'fractionSpotIndex'),
        notSeeable,
      };
      return { ...result, words: wordsFor(result, crude, fraction, under) };
    }),
  );
}
