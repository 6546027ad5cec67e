import { readFile } from 'node:fs/promises';
import type { PhotoSize } from './photo-decoder';
import { photoJob } from './photo-thread';

/**
 * Decodes a HEIC photo as a whole and tells its size as shown. 422 with what to do for a broken, oversized or otherwise
 * coded one; 503 when it takes too long. Nothing of the decoded picture is kept. The file's size is limited before.
 */
export async function inspectHeic(path: string): Promise<PhotoSize> {
  const { width, height } = await photoJob<'heic to jpeg'>({
    kind: 'heic to jpeg',
    bytes: await readFile(path),
  });
  return { widthPx: width, heightPx: height };
}
