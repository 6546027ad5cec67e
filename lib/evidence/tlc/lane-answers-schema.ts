import { z } from 'zod';

const compound = z.object({ id: z.uuid(), name: z.string() });

const match = z.object({
  laneId: z.uuid(),
  label: z.string(),
  kind: z.enum(['reference', 'co-spot']),
  compound: compound.nullable(),
  spotIndex: z.number().int(),
  rf: z.number(),
  difference: z.number().describe('Rf of the spot less Rf of the reference'),
  limit: z.number().describe('2 sqrt(u1² + u2²)'),
});

/** What one spot of a fraction or crude lane agrees with on its plate. */
export const spotComparison = z.object({
  laneId: z.uuid(),
  label: z.string(),
  spotIndex: z.number().int().describe('among the spots of the lane in this photo, from 0'),
  rf: z.number(),
  agreesWith: z.array(match).describe('reference and co-spot spots at the same place, the nearest first'),
  words: z.string(),
});

const laneName = z.object({ laneId: z.uuid(), label: z.string() });

/** The crude against a fraction in one photo. */
export const beforeAfter = z.object({
  crude: laneName,
  fraction: laneName.extend({ code: z.string().nullable() }),
  disappeared: z.array(z.object({ spotIndex: z.number().int(), rf: z.number() })),
  stayed: z.array(
    z.object({
      crudeSpotIndex: z.number().int(),
      fractionSpotIndex: z.number().int(),
      rf: z.number(),
    }),
  ),
  appeared: z.array(z.object({ spotIndex: z.number().int(), rf: z.number() })),
  notSeeable: z.array(
    z.object({
      compound: z.object({ id: z.string(), name: z.string() }),
      isTarget: z.boolean(),
      state: z.enum(['blind', 'uncertain']),
      reason: z.string(),
    }),
  ),
  words: z.array(z.string()),
});

/** The spots of a lane over all photos: what two photos show at the same place is one spot. */
export const distinctSpots = z.object({
  laneId: z.uuid(),
  label: z.string(),
  spots: z.array(
    z.object({
      rf: z.number(),
      rfUncertainty: z.number(),
      seenIn: z.array(
        z.object({
          photoId: z.uuid(),
          evidenceId: z.uuid(),
          visualiser: z.string(),
          index: z.number().int(),
          rf: z.number(),
          rfUncertainty: z.number(),
        }),
      ),
    }),
  ),
});
