import { compareRf, type RfValue } from './agree';
import type { ComparedSubject } from './compare-lanes';

/** A lane with its background-corrected profile, as far as its place was known. */
export type ProfiledForEstimate = {
  laneId: string;
  label: string;
  subject: ComparedSubject;
  dilutionPercent: number | null;
  spots: readonly RfValue[];
  profile: { rf: readonly number[]; signal: readonly number[]; noise: number } | null;
};

export type DilutionEstimate = {
  laneId: string;
  label: string;
  /** What the amount is stated of. */
  of: { kind: 'crude' | 'reference'; compound: { id: string; name: string } | null; rf: number };
  state: 'fainter' | 'between' | 'as strong or stronger' | 'not judged';
  /** Percent of the undiluted sample; null where nothing can be stated. */
  abovePercent: number | null;
  belowPercent: number | null;
  words: string;
};

export const dilutionLimits =
  'An estimate within one plate and one visualiser, for equal volumes spotted: the signal grows with the amount but not in proportion, so areas rank amounts and do not measure them (semi-quantitative).';

/** A rung must stand out this much over the noise of its own lane to say anything. */
const LEAST_OVER_NOISE = 3;
/** Half of the window about an Rf over which a profile is summed. */
const HALF_WINDOW_RF = 0.035;

type Rung = { label: string; percent: number; area: number; seen: boolean };

/** Signed area of a profile about an Rf, and its standard deviation from the noise of its points. */
function areaAt({ rf, signal, noise }: NonNullable<ProfiledForEstimate['profile']>, place: number) {
  const step = rf.length > 1 ? rf[1]! - rf[0]! : 0;
  let [area, count] = [0, 0];
  rf.forEach((at, i) => {
    if (Math.abs(at - place) > HALF_WINDOW_RF) return;
    area += signal[i]! * step;
    count += 1;
  });
  return { area, noise: noise * step * Math.sqrt(Math.max(1, count)) };
}

/** The spot of a lane at a place, which says where exactly its profile is to be summed. */
function spotAt(lane: ProfiledForEstimate, at: RfValue): RfValue | null {
  const agreeing = lane.spots.filter((spot) => compareRf(spot, at, true).state === 'agree');
  return agreeing.sort((a, b) => Math.abs(a.rf - at.rf) - Math.abs(b.rf - at.rf))[0] ?? null;
}

const keyOf = ({ subject }: ProfiledForEstimate) => `${subject.kind} ${subject.compound?.id ?? ''}`;

function nameOf(lane: ProfiledForEstimate): string {
  return lane.subject.kind === 'crude' ? 'the crude' : (lane.subject.compound?.name ?? 'the reference');
}

function estimateOne(
  lane: ProfiledForEstimate,
  ladder: readonly ProfiledForEstimate[],
  at: RfValue,
): DilutionEstimate {
  const name = nameOf(ladder[0]!);
  const of = {
    kind: ladder[0]!.subject.kind as 'crude' | 'reference',
    compound: ladder[0]!.subject.compound ?? null,
    rf: at.rf,
  };
  const say = (
    state: DilutionEstimate['state'],
    abovePercent: number | null,
    belowPercent: number | null,
    words: string,
  ): DilutionEstimate => ({
    laneId: lane.laneId,
    label: lane.label,
    of,
    state,
    abovePercent,
    belowPercent,
    words: `Lane ${lane.label}, ${name} at Rf ${at.rf.toFixed(2)}: ${words}`,
  });
  if (!lane.profile) return say('not judged', null, null, 'the lane has no profile; mark its place.');
  const own = spotAt(lane, at);
  const covering = own
    ? undefined
    : lane.spots.find((spot) => Math.abs(spot.rf - at.rf) < 2 * HALF_WINDOW_RF);
  if (covering)
    return say(
      'not judged',
      null,
      null,
      `a spot at Rf ${covering.rf.toFixed(2)} lies so near that it may cover it.`,
    );
  const rungs = ladder
    .flatMap((one): Rung[] => {
      if (!one.profile) return [];
      const { area, noise } = areaAt(one.profile, spotAt(one, at)?.rf ?? at.rf);
      const percent = one.dilutionPercent ?? 100;
      return [{ label: one.label, percent, area, seen: area > LEAST_OVER_NOISE * noise }];
    })
    .sort((a, b) => a.percent - b.percent);
  const seen = rungs.filter((rung) => rung.seen);
  if (seen.length === 0)
    return say(
      'not judged',
      null,
      null,
      'the diluted lanes show nothing there themselves, so no limit can be stated.',
    );
  if (seen.some((rung, i) => i > 0 && rung.area <= seen[i - 1]!.area))
    return say(
      'not judged',
      null,
      null,
      'the diluted lanes do not grow with their amounts; spot them again.',
    );
  const { area } = areaAt(lane.profile, own?.rf ?? at.rf);
  const above = seen.filter((rung) => area >= rung.area).at(-1) ?? null;
  const below = seen.find((rung) => area < rung.area) ?? null;
  if (!above && below)
    return say('fainter', null, below.percent, `fainter than the ${below.percent} % lane.`);
  if (above && below)
    return say(
      'between',
      above.percent,
      below.percent,
      `between the ${above.percent} % and the ${below.percent} % lane.`,
    );
  return say(
    'as strong or stronger',
    above!.percent,
    null,
    `at least as strong as the ${above!.percent} % lane, the strongest there is.`,
  );
}

/**
 * How much of a reference compound, or of a spot of the crude, the fraction lanes hold at most, by comparison with
 * diluted lanes of it on the same plate and photo: "fainter than the 1 % lane". Only where a lane was diluted. Places are
 * those of the strongest lane's spots; a lane without dilution counts as 100 %. Pure.
 */
export function estimateByDilution(lanes: readonly ProfiledForEstimate[]): DilutionEstimate[] {
  const ladders = new Map<string, ProfiledForEstimate[]>();
  for (const lane of lanes) {
    if (lane.subject.kind !== 'crude' && lane.subject.kind !== 'reference') continue;
    ladders.set(keyOf(lane), [...(ladders.get(keyOf(lane)) ?? []), lane]);
  }
  const fractions = lanes.filter((lane) => lane.subject.kind === 'fraction');
  return [...ladders.values()].flatMap((ladder) => {
    if (!ladder.some((lane) => lane.dilutionPercent !== null)) return [];
    const strongest = ladder.reduce((best, lane) =>
      lane.spots.length > 0 &&
      (lane.dilutionPercent ?? 100) > (best.spots.length > 0 ? (best.dilutionPercent ?? 100) : 0)
        ? lane
        : best,
    );
    return fractions.flatMap((lane) => strongest.spots.map((at) => estimateOne(lane, ladder, at)));
  });
}
