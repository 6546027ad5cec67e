import type { EvidenceFile } from '@/lib/database/records';
import { openPhoto } from './photo-decoder';
import { readPhotoBytes } from './read-photo-bytes';
import { previewWidths } from './schema';

/** Part of the entity tag: a new way of making previews makes new ones. */
const previewMethod = 'p1';
/** Decoding a large photo takes much memory: so many at a time, the others wait. */
const atOnce = 2;

let running = 0;
const waiting: (() => void)[] = [];

async function oneOfFew<T>(work: () => Promise<T>): Promise<T> {
  while (running >= atOnce) await new Promise<void>((resolve) => waiting.push(resolve));
  running += 1;
  try {
    return await work();
  } finally {
    running -= 1;
    waiting.shift()?.();
  }
}

export function snapWidth(width: number): number {
  return previewWidths.find((step) => step >= width) ?? previewWidths.at(-1)!;
}

/**
 * A small picture of a photo: upright, in sRGB, as WebP, and without any metadata, so that no place, person or device
 * travels with it. 304 for a known one. The photo must be one (requirePhoto).
 */
export async function previewResponse(
  evidence: EvidenceFile,
  width: number,
  request: Request,
): Promise<Response> {
  const snapped = snapWidth(width);
  const tag = `"${evidence.sha256}-${previewMethod}-${snapped}"`;
  const headers = {
    etag: tag,
    'cache-control': 'private, max-age=31536000, immutable',
    'x-content-type-options': 'nosniff',
    vary: 'Cookie, Authorization',
  };
  if (
    request.headers
      .get('if-none-match')
      ?.split(',')
      .some((one) => one.trim() === tag)
  ) {
    return new Response(null, { status: 304, headers });
  }
  const picture = await oneOfFew(async () => {
    const bytes = await readPhotoBytes(evidence);
    return openPhoto(bytes)
      .resize({ width: snapped, withoutEnlargement: true })
      .webp({ quality: 82 })
      .toBuffer();
  });
  return new Response(new Uint8Array(picture), {
    headers: { ...headers, 'content-type': 'image/webp', 'content-length': String(picture.byteLength) },
  });
}
