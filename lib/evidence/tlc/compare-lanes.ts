import { type Agreement, compareRf, type RfValue } from './agree';

export type ComparedSubject = {
  kind: 'fraction' | 'crude' | 'reference' | 'co-spot' | 'blank';
  code?: string;
  compound?: { id: string; name: string };
};

export type ComparedLane = {
  id: string;
  label: string;
  subject: ComparedSubject;
  dilutionPercent?: number | null;
  spots: readonly RfValue[];
};

export type SpotMatch = {
  laneId: string;
  label: string;
  kind: 'reference' | 'co-spot';
  compound: { id: string; name: string } | null;
  spotIndex: number;
  rf: number;
  difference: number;
  limit: number;
};

export type SpotComparison = {
  laneId: string;
  label: string;
  spotIndex: number;
  rf: number;
  /** The reference and co-spot spots at the same place within the combined uncertainty, the nearest first. */
  agreesWith: SpotMatch[];
  words: string;
};

/** "lane R (ethyl acetate)" */
export function laneWords({ label, subject }: Pick<ComparedLane, 'label' | 'subject'>): string {
  const what = subject.compound?.name ?? subject.code;
  return what ? `lane ${label} (${what})` : `lane ${label}`;
}

type Candidate = { lane: ComparedLane; spotIndex: number; rf: number; agreement: Agreement };

function candidatesFor(spot: RfValue, references: readonly ComparedLane[]): Candidate[] {
  return references
    .flatMap((lane) =>
      lane.spots.map((other, spotIndex) => ({
        lane,
        spotIndex,
        rf: other.rf,
        agreement: compareRf(spot, other, true),
      })),
    )
    .sort((a, b) => Math.abs(a.agreement.difference) - Math.abs(b.agreement.difference));
}

/** Two spots in the co-spot lane where fraction and reference seem to agree: they are two compounds after all. */
function splitInCoSpot(spot: RfValue, matches: readonly Candidate[], lanes: readonly ComparedLane[]): string {
  const own = matches.find((one) => one.lane.subject.kind === 'reference');
  if (!own) return '';
  const compoundId = own.lane.subject.compound?.id;
  const coSpot = lanes.find(
    (lane) => lane.subject.kind === 'co-spot' && (!compoundId || lane.subject.compound?.id === compoundId),
  );
  if (!coSpot) return '';
  const near = coSpot.spots.filter((other) => compareRf(spot, other, true).state === 'agree');
  return near.length > 1
    ? ` The co-spot in lane ${coSpot.label} shows ${near.length} spots there, so they are different compounds.`
    : '';
}

function wordsFor(
  lane: ComparedLane,
  spot: RfValue,
  candidates: readonly Candidate[],
  lanes: readonly ComparedLane[],
): string {
  const name = `Spot at Rf ${spot.rf.toFixed(2)} in ${laneWords(lane)}`;
  const agreeing = candidates.filter((one) => one.agreement.state === 'agree');
  if (agreeing.length > 0) {
    const list = agreeing.map((one) => `${laneWords(one.lane)} at Rf ${one.rf.toFixed(2)}`).join(' and ');
    return `${name} agrees with ${list} (${agreeing[0]!.agreement.reason.replace(/\.$/, '')}).${splitInCoSpot(spot, agreeing, lanes)}`;
  }
  const [nearest] = candidates;
  return nearest
    ? `${name} agrees with no reference; the nearest is ${laneWords(nearest.lane)} at Rf ${nearest.rf.toFixed(2)} (${nearest.agreement.reason.replace(/\.$/, '')}).`
    : `${name}: no reference on this plate has a spot to compare with.`;
}

/**
 * For every spot of the fraction and crude lanes of one photo: the spots of reference and co-spot lanes that it agrees
 * with, |dRf| <= 2 sqrt(u1^2 + u2^2) (JCGM 100:2008). One plate only, as Ph. Eur. 2.2.27 and USP <203> compare.
 * Agreement says that they may be the same compound, a difference that they are not.
 */
export function compareLanes(lanes: readonly ComparedLane[]): SpotComparison[] {
  const references = lanes.filter(
    ({ subject }) => subject.kind === 'reference' || subject.kind === 'co-spot',
  );
  return lanes
    .filter(({ subject }) => subject.kind === 'fraction' || subject.kind === 'crude')
    .flatMap((lane) =>
      lane.spots.map((spot, spotIndex): SpotComparison => {
        const candidates = candidatesFor(spot, references);
        const agreesWith = candidates
          .filter((one) => one.agreement.state === 'agree')
          .map((one): SpotMatch => ({
            laneId: one.lane.id,
            label: one.lane.label,
            kind: one.lane.subject.kind as 'reference' | 'co-spot',
            compound: one.lane.subject.compound ?? null,
            spotIndex: one.spotIndex,
            rf: one.rf,
            difference: one.agreement.difference,
            limit: one.agreement.limit,
          }));
        const words = wordsFor(lane, spot, candidates, lanes);
        return { laneId: lane.id, label: lane.label, spotIndex, rf: spot.rf, agreesWith, words };
      }),
    );
}
