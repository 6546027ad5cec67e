import { z } from 'zod';

export const scopes = ['evidence:write', 'readings:write'] as const;

export const createInstrumentBody = z.strictObject({
  group: z.uuid(),
  name: z.string().trim().min(1, 'Write the name on the instrument.').max(160),
  kind: z.string().trim().min(1, 'Write what it is, such as gas chromatograph.').max(60),
  serialNumber: z.string().trim().max(120).optional(),
  place: z.string().trim().max(160).optional(),
});

export const createTokenBody = z.strictObject({
  instrument: z.uuid(),
  name: z.string().trim().min(1, 'Write which machine will use it.').max(120),
  scopes: z.array(z.enum(scopes)).min(1, 'Choose at least one right.'),
  expiresInDays: z.number().int().min(1).max(730).default(365),
});

export const instrumentSchema = z.object({
  id: z.string(),
  group: z.string(),
  groupName: z.string(),
  name: z.string(),
  kind: z.string(),
  serialNumber: z.string().nullable(),
  place: z.string().nullable(),
  version: z.number(),
});

export const tokenSchema = z.object({
  id: z.string(),
  instrument: z.string(),
  instrumentName: z.string(),
  name: z.string(),
  hint: z.string(),
  scopes: z.array(z.string()),
  expiresAt: z.string(),
  revokedAt: z.string().nullable(),
  lastSeenAt: z.string().nullable(),
});
export const newTokenSchema = tokenSchema.extend({ token: z.string() });
export type PresentedInstrument = z.infer<typeof instrumentSchema>;
export type PresentedToken = z.infer<typeof tokenSchema>;
