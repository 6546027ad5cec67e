import { z } from 'zod';
import { plateProposal } from '@/lib/evidence/tlc/proposal-schema';
import { pointSchema, spotShapes } from '@/lib/evidence/tlc/schema';

const proposed = z.number().min(0).max(1).optional();
const point = pointSchema.extend({ proposed });

/** Marks that were not saved yet, kept on the device for each photo, so that a dropped phone loses nothing. */
export const draftSchema = z.object({
  keptAt: z.string(),
  facts: z.object({
    stationaryPhase: z.string(),
    eluent: z.string(),
    visualiser: z.string(),
    widthMm: z.string(),
    heightMm: z.string(),
    note: z.string(),
  }),
  marks: z.object({
    corners: z.array(point),
    baseline: z.array(point),
    front: z.array(point),
    lanes: z.array(
      z.object({
        label: z.string(),
        x: z.number(),
        proposed,
        subject: z.object({
          kind: z.enum(['fraction', 'crude', 'reference', 'co-spot', 'blank']).nullable(),
          code: z.string().optional(),
          compound: z.object({ id: z.string(), name: z.string() }).optional(),
        }),
        dilutionPercent: z.string(),
        spots: z.array(point.extend({ shape: z.enum(spotShapes) })),
      }),
    ),
  }),
  /** The proposal that the marks began with, sent along with them. */
  proposal: plateProposal.nullable(),
});
export type Draft = z.infer<typeof draftSchema>;
