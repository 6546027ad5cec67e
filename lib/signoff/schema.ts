import { z } from 'zod';

/** What a signature can mean: a closed list, since a free text would mean anything. */
export const signatureMeanings = [
  'reviewed and released for use',
  'reviewed and released for pooling',
  'reviewed and released for shipment',
] as const;

const reason = z.string().trim().min(3, 'Say why, in a few words.').max(1000);

export const submitBody = z.strictObject({
  comment: z.string().trim().max(1000).optional().describe('a word to the analyst'),
});
export const returnBody = z.strictObject({
  reason: reason.describe('what has to be done before it comes back'),
});
export const reopenBody = z.strictObject({ reason: reason.describe('why the signature no longer holds') });
export const signOffBody = z.strictObject({
  password: z.string().min(1).max(1000).describe('the password of the account, once more'),
  meaning: z.enum(signatureMeanings),
  comment: z.string().trim().max(1000).optional(),
});

export const signatureSchema = z.object({
  id: z.string(),
  code: z.string().describe('to be typed on the public verification page'),
  signer: z.string(),
  role: z.string(),
  meaning: z.string(),
  comment: z.string().nullable(),
  signedAt: z.string(),
  manifestDigest: z.string().describe('SHA-256 of the canonical JSON (RFC 8785) of what was signed'),
  inForce: z.boolean(),
  supersededAt: z.string().nullable(),
  supersededReason: z.string().nullable(),
});

/** The answer of every step of a fraction's life. */
export const stepSchema = z.object({
  code: z.string(),
  status: z.string(),
  verdictState: z.string(),
  version: z.number().int(),
  signature: signatureSchema.optional(),
});

export type SignOffBody = z.output<typeof signOffBody>;
