import { z } from 'zod';

/** The longest that a link may live, days. */
export const longestShareDays = 90;

export const newShareSchema = z.strictObject({
  recipient: z.string().trim().max(254).optional().describe('whom it is for, for your own record'),
  expiresInDays: z.number().int().min(1).max(longestShareDays).default(30),
});

export const shareSchema = z.object({
  id: z.string(),
  recipient: z.string().nullable(),
  madeBy: z.string(),
  createdAt: z.string(),
  expiresAt: z.string(),
  revokedAt: z.string().nullable(),
  version: z.number().int(),
});

export const madeShareSchema = shareSchema.extend({
  token: z.string().describe('shown this once; only its SHA-256 is kept'),
  url: z.string(),
});
export const shareListSchema = z.object({ items: z.array(shareSchema), nextCursor: z.null() });
export const revokeShareQuery = z.strictObject({ id: z.uuid().describe('id of the link to revoke') });

export type ShareJson = z.output<typeof shareSchema>;
