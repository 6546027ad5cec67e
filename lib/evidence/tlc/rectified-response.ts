import { createHash } from 'node:crypto';
import { z } from 'zod';
import type { Actor } from '@/lib/auth/actor';
import { keepFew } from '../keep-few';
import { photoJob } from '../photo-thread';
import { readPhotoBytes } from '../read-photo-bytes';
import { plateAspect } from './plate-aspect';
import { requireFramedPhoto } from './require-photo-of-plate';

export const rectifiedQuery = z.strictObject({
  photo: z.uuid().optional().describe('evidence id of a photo of the plate; left out: the one marked last'),
  width: z.coerce.number().int().min(64).max(1600).default(800).describe('pixels'),
});

/** Part of the entity tag: a new way of making pictures makes new ones. */
const method = 'r1';
/** A plate much longer than wide gets no picture larger than this, pixels high. */
const HIGHEST_PX = 3200;
const keep = keepFew<Uint8Array>(12);

/**
 * A plate as if seen from straight above: its photo warped by the corners, WebP, without metadata. 304 for a known
 * one; 404 and 422 as requireFramedPhoto.
 */
export async function rectifiedResponse(
  actor: Actor,
  plateId: string,
  query: z.infer<typeof rectifiedQuery>,
  request: Request,
): Promise<Response> {
  const { plate, photo, evidence } = await requireFramedPhoto(actor, plateId, query.photo);
  const { corners } = photo;
  const aspect = plateAspect(corners, plate);
  const width = Math.max(16, Math.min(query.width, Math.floor(HIGHEST_PX / aspect)));
  const height = Math.max(16, Math.round(width * aspect));
  const facts = JSON.stringify([method, evidence.sha256, corners, width, height]);
  const tag = `"${createHash('sha256').update(facts).digest('hex')}"`;
  const headers = {
    etag: tag,
    'cache-control': 'private, no-cache',
    'x-content-type-options': 'nosniff',
    vary: 'Cookie, Authorization',
  };
  if (request.headers.get('if-none-match')?.includes(tag))
    return new Response(null, { status: 304, headers });
  const webp = await keep(tag, async () => {
    const bytes = await readPhotoBytes(evidence);
    return (await photoJob<'warp'>({ kind: 'warp', bytes, request: { corners, width, height } })).webp;
  });
  return new Response(new Uint8Array(webp), {
    headers: { ...headers, 'content-type': 'image/webp', 'content-length': String(webp.byteLength) },
  });
}
