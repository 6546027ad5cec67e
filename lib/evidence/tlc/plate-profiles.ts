import { z } from 'zod';
import type { Actor } from '@/lib/auth/actor';
import { invalidField } from '@/lib/errors';
import { keepFew } from '../keep-few';
import { photoJob } from '../photo-thread';
import { readPhotoBytes } from '../read-photo-bytes';
import { dilutionLimits, estimateByDilution } from './estimate-dilution';
import type { ProfiledLane, ProfileMarks } from './profile-photo';
import { laneFoot } from './project-marks';
import { type FramedPhoto, requireFramedPhoto } from './require-photo-of-plate';

export const PROFILE_METHOD_VERSION = 'lane-profile-1';

export const profilesQuery = z.strictObject({
  photo: z.uuid().optional().describe('evidence id of a photo of the plate; left out: the one marked last'),
});

const area = z.object({
  spotIndex: z.number().int(),
  rf: z.number(),
  fromRf: z.number(),
  toRf: z.number(),
  area: z.number(),
  percentOfLane: z.number().describe('of the areas of the marked spots of this lane'),
});

export const profilesResponse = z.object({
  evidenceId: z.uuid(),
  visualiser: z.string(),
  lanes: z.array(
    z.object({
      laneId: z.uuid(),
      label: z.string(),
      rf: z.array(z.number()).describe('at most 300 places along the lane'),
      signal: z
        .array(z.number())
        .describe('background taken off, in standard deviations of the noise of one pixel'),
      noise: z.number().nullable().describe('standard deviation of the signal where there is no spot'),
      areas: z.array(area),
    }),
  ),
  estimates: z.array(
    z.object({
      laneId: z.uuid(),
      label: z.string(),
      of: z.object({
        kind: z.enum(['crude', 'reference']),
        compound: z.object({ id: z.uuid(), name: z.string() }).nullable(),
        rf: z.number(),
      }),
      state: z.enum(['fainter', 'between', 'as strong or stronger', 'not judged']),
      abovePercent: z.number().nullable(),
      belowPercent: z.number().nullable(),
      words: z.string(),
    }),
  ),
  limits: z.string(),
  methodVersion: z.string(),
});
export type PlateProfiles = z.infer<typeof profilesResponse>;

const keep = keepFew<(ProfiledLane | null)[]>(16);

function marksInPixels({ photo, toPixels }: FramedPhoto): ProfileMarks {
  const line = (key: 'baseline' | 'front') => {
    const points = photo[key].map(toPixels);
    if (points.some((point) => point === null))
      throw invalidField('photo', 'The lines of this photo do not lie on its plate: mark them again.');
    return points.flatMap((point) => point ?? []);
  };
  return {
    corners: photo.corners,
    baseline: line('baseline'),
    front: line('front'),
    lanes: photo.lanes.map((lane) => {
      const foot = laneFoot(photo, lane);
      const spots = lane.spots.flatMap((spot) => {
        const at = toPixels(spot);
        return at ? [{ ...at, rf: spot.rf }] : [];
      });
      return { foot: foot && toPixels(foot), spots };
    }),
  };
}

/**
 * The profile of each lane of a photo, the areas of its marked spots as shares of the lane, and what diluted lanes say
 * about the fractions. Measured from the stored photo, nothing is kept. 404, 422, 503.
 */
export async function plateProfiles(
  actor: Actor,
  plateId: string,
  evidenceId: string | undefined,
): Promise<PlateProfiles> {
  const framed = await requireFramedPhoto(actor, plateId, evidenceId);
  const { photo, evidence } = framed;
  const marks = marksInPixels(framed);
  const measured = await keep(JSON.stringify([evidence.sha256, marks]), async () => {
    const bytes = await readPhotoBytes(evidence);
    return (await photoJob<'profiles'>({ kind: 'profiles', bytes, marks })).lanes;
  });
  return {
    evidenceId: photo.evidenceId,
    visualiser: photo.visualiser,
    lanes: photo.lanes.map((lane, l) => {
      const profile = measured[l] ?? null;
      return {
        laneId: lane.id,
        label: lane.label,
        rf: profile?.rf ?? [],
        signal: profile?.signal ?? [],
        noise: profile?.noise ?? null,
        areas: (profile?.areas ?? []).map(({ shareOfLane, ...one }, spotIndex) => ({
          spotIndex,
          ...one,
          percentOfLane: 100 * shareOfLane,
        })),
      };
    }),
    estimates: estimateByDilution(
      photo.lanes.map((lane, l) => ({ ...lane, laneId: lane.id, profile: measured[l] ?? null })),
    ),
    limits: dilutionLimits,
    methodVersion: PROFILE_METHOD_VERSION,
  };
}
