import { z } from 'zod';
import { pointSchema, spotShapes } from '@/lib/evidence/tlc/schema';
import type { Facts } from './facts';
import type { Marks } from './marks';

/** Marks that were not saved yet, kept on the device for each photo, so that a dropped phone loses nothing. */
export type Draft = { marks: Marks; facts: Facts; keptAt: string };

const subject = z.object({
  kind: z.enum(['fraction', 'crude', 'reference', 'co-spot', 'blank']),
  code: z.string().optional(),
  compound: z.object({ id: z.string(), name: z.string() }).optional(),
});
const draftSchema = z.object({
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
    baseline: z.array(pointSchema),
    front: z.array(pointSchema),
    lanes: z.array(
      z.object({
        label: z.string(),
        x: z.number(),
        subject,
        spots: z.array(z.object({ x: z.number(), y: z.number(), shape: z.enum(spotShapes) })),
      }),
    ),
  }),
});

const keyOf = (evidenceId: string) => `heartcut-marks:${evidenceId}`;

/** The draft of a photo; null when there is none, or when it was written by another version of this page. */
export function readDraft(evidenceId: string): Draft | null {
  try {
    const text = localStorage.getItem(keyOf(evidenceId));
    const parsed = text ? draftSchema.safeParse(JSON.parse(text)) : null;
    return parsed?.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** False when the device does not keep it (storage switched off or full). */
export function keepDraft(evidenceId: string, draft: Omit<Draft, 'keptAt'>): boolean {
  try {
    localStorage.setItem(keyOf(evidenceId), JSON.stringify({ ...draft, keptAt: new Date().toISOString() }));
    return true;
  } catch {
    return false;
  }
}

export function dropDraft(evidenceId: string): void {
  try {
    localStorage.removeItem(keyOf(evidenceId));
  } catch {
    // Nothing was kept either.
  }
}
