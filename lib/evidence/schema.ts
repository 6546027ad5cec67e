import { z } from 'zod';
import { evidenceKinds } from './kinds';

const code = z.string().trim().min(1).max(60);

/** Query parameters of an upload. */
export const uploadQuery = z.strictObject({
  fraction: code.optional().describe('code of the fraction that the file belongs to'),
  run: code.optional().describe('code of the run, for a file of the whole run'),
  kind: z.enum(evidenceKinds).optional().describe('left out: what the bytes usually are'),
  takenAt: z.iso.datetime({ offset: true }).optional().describe('when the photo or measurement was made'),
});
export type UploadQuery = z.infer<typeof uploadQuery>;

export const evidenceId = z.strictObject({ id: z.uuid() });

export const evidenceResponse = z.object({
  id: z.uuid(),
  kind: z.enum(evidenceKinds),
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
  sizeBytes: z.number().int(),
  mediaType: z.string(),
  fileName: z.string(),
  widthPx: z.number().int().nullable().describe('of a photo, after its EXIF orientation'),
  heightPx: z.number().int().nullable(),
  takenAt: z.iso.datetime().nullable(),
  fraction: z.string().nullable().describe('code'),
  run: z.string().nullable().describe('code'),
  sentBy: z.object({ kind: z.enum(['user', 'token']), name: z.string() }),
  createdAt: z.iso.datetime(),
  version: z.number().int(),
});
export type EvidenceView = z.infer<typeof evidenceResponse>;

export const evidenceLinks = z.object({
  self: z.string(),
  content: z.string(),
  preview: z.string().optional(),
});

export const evidenceAnswer = z.object({ evidence: evidenceResponse, links: evidenceLinks });
export type EvidenceAnswer = z.infer<typeof evidenceAnswer>;

export const uploadAnswer = evidenceAnswer.extend({
  tray: z
    .object({ id: z.uuid(), reason: z.string() })
    .optional()
    .describe('present when the file waits in the tray for its fraction'),
  notes: z
    .array(z.string())
    .optional()
    .describe('what could not be read from the stored file, and what to do'),
});
export type UploadAnswer = z.infer<typeof uploadAnswer>;

/** Widths of previews: few, so that a browser's cache is hit. */
export const previewWidths = [64, 128, 256, 512, 1024, 1536, 2048] as const;
export const previewQuery = z.strictObject({
  width: z.coerce
    .number()
    .int()
    .min(64)
    .max(2048)
    .default(512)
    .describe(`pixels, raised to the next of ${previewWidths.join(', ')}`),
});
