import { z } from 'zod';

const number = z.number().min(-1_000_000).max(1_000_000);
const share = z.number().min(0).max(1);
const point = z.object({ x: number, y: number });

const spot = point.extend({
  rf: z.number().nullable().describe('null where baseline or front was not found'),
  relativeIntensity: share.describe('share of the area under the profile of its lane'),
  shape: z.enum(['spot', 'streak']),
  confidence: share,
});

/** What could be marked on a plate's photo, in pixels of the photo as shown, origin top left. */
export const plateSuggestion = z.object({
  corners: z.array(point).max(4).describe('top left, top right, bottom right, bottom left'),
  baseline: z.array(point).max(5).describe('empty where no line was seen'),
  front: z.array(point).max(5),
  lanes: z
    .array(
      z.object({
        x: number.describe('where the lane crosses the baseline'),
        y: number.optional(),
        spots: z.array(spot).max(60),
      }),
    )
    .max(60),
  ground: z.string().max(60).describe('what the layer looks like'),
  confidence: share.describe('of the least certain of corners, lines and spots'),
  reasons: z.array(z.string().max(400)).max(20).describe('what lowers the confidence and what to do'),
  methodVersion: z.string().max(60),
});

/** The same as it comes back with the marks of a person; what is not fixed by the contract may be left out. */
export const plateProposal = plateSuggestion
  .partial({ ground: true, reasons: true, methodVersion: true, confidence: true })
  .extend({
    lanes: z
      .array(
        z.object({
          x: number,
          y: number.optional(),
          spots: z.array(spot.partial({ shape: true, confidence: true, relativeIntensity: true })).max(60),
        }),
      )
      .max(60),
  });
export type PlateProposal = z.infer<typeof plateProposal>;

export const proposalDiff = z.object({
  accepted: z.number().int().describe('marks taken as they were proposed'),
  moved: z.number().int(),
  added: z.number().int(),
  removed: z.number().int(),
});
