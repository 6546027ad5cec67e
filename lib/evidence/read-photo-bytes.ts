import type { EvidenceFile } from '@/lib/database/records';
import { objectKeyFor } from '@/storage/keys';
import { readObject } from '@/storage/read-object';
import { keepFew } from './keep-few';
import { isHeicType, kindFacts } from './kinds';
import { photoJob } from './photo-thread';

/** Decoded HEIC photos are kept for a while, since several sizes of one are asked for at once. */
const keep = keepFew<Buffer>(4);

/**
 * The bytes of a stored photo in a form that every step after it can open: the original, or for HEIC a JPEG of the same
 * size made from it. The original stays as it was sent. Throws what the store and the decoder throw (422, 503).
 */
export async function readPhotoBytes({ sha256, mediaType }: EvidenceFile): Promise<Buffer> {
  const read = () => readObject(objectKeyFor(sha256), { maxBytes: kindFacts.document.maxBytes });
  if (!isHeicType(mediaType)) return read();
  return keep(sha256, async () => {
    const { jpeg } = await photoJob<'heic to jpeg'>({ kind: 'heic to jpeg', bytes: await read() });
    return Buffer.from(jpeg);
  });
}
