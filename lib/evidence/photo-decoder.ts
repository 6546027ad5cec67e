import sharp, { type Sharp } from 'sharp';
import { Problem } from '@/lib/errors';

// Only the four decoders that plate photos need: what is switched off cannot be attacked by a crafted file.
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({
  operation: ['VipsForeignLoadJpeg', 'VipsForeignLoadPng', 'VipsForeignLoadWebp', 'VipsForeignLoadTiff'],
});
sharp.cache(false);

/** More than any phone in use takes; a small file that unfolds to more is not a photo. */
const maxPixels = 80_000_000;

/** Opens a photo, turned as its EXIF orientation says. Damage of any kind is an error, never a grey stripe. */
export function openPhoto(source: string | Buffer): Sharp {
  return sharp(source, { limitInputPixels: maxPixels, failOn: 'error', sequentialRead: true }).autoOrient();
}

export type PhotoSize = { widthPx: number; heightPx: number };

/**
 * Decodes a photo from its first to its last row and tells its size as shown (after EXIF orientation). 422 with what
 * to do for a broken or oversized one. Nothing of the decoded picture is kept.
 */
export async function inspectPhoto(path: string): Promise<PhotoSize> {
  let size: { width: number; height: number };
  try {
    size = (await sharp(path, { limitInputPixels: false }).metadata()).autoOrient;
  } catch {
    throw broken();
  }
  if (size.width * size.height > maxPixels) {
    throw new Problem(
      'invalid',
      `The photo has ${Math.round((size.width * size.height) / 1e6)} megapixels; at most ${maxPixels / 1e6} are taken. Choose a lower resolution.`,
    );
  }
  try {
    await openPhoto(path).resize({ width: 32 }).raw().toBuffer();
  } catch {
    throw broken();
  }
  return { widthPx: size.width, heightPx: size.height };
}

function broken(): Problem {
  return new Problem(
    'invalid',
    'The photo is damaged or not complete. Take it again, or copy it from the camera again, and send it once more.',
  );
}
