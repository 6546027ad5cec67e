import { createRequire } from 'node:module';
import type { Sharp } from 'sharp';

/** More than the largest phone camera in use; a decoded picture takes four bytes a pixel, twice. */
export const MOST_HEIC_PIXELS = 51_000_000;

type HeifImage = {
  get_width(): number;
  get_height(): number;
  is_primary(): boolean;
  display(
    into: { data: Uint8ClampedArray; width: number; height: number },
    done: (result: { data: Uint8ClampedArray } | null) => void,
  ): void;
  free(): void;
};
type Decoder = { decode(bytes: Uint8Array): HeifImage[] };
type LibHeif = { HeifDecoder: new () => Decoder };

/** What is wrong with a HEIC file, in words for the user. */
export class HeicProblem extends Error {}

const broken = () =>
  new HeicProblem(
    'The HEIC photo is damaged or not complete. Copy it from the phone again, or export it as JPEG.',
  );

// Its own build for Node: two megabytes that only a thread which meets a HEIC photo loads.
const load = () => createRequire(import.meta.url)('libheif-js/wasm-bundle') as LibHeif;
let library: LibHeif | null = null;

/**
 * Decodes the primary picture of a HEIC or HEIF file, turned and mirrored as the file says (irot and imir of ISO/IEC
 * 23008-12, so its EXIF orientation must not be applied again). Blocks for about a twentieth of a second a megapixel:
 * meant for a worker thread. Throws a HeicProblem for damaged, too large or otherwise coded files.
 */
export async function decodeHeic(
  bytes: Uint8Array,
): Promise<{ data: Uint8ClampedArray; width: number; height: number }> {
  library ??= load();
  let images: HeifImage[];
  try {
    images = new library.HeifDecoder().decode(bytes);
  } catch {
    throw broken();
  }
  try {
    const image = images.find((one) => one.is_primary()) ?? images[0];
    if (!image) throw broken();
    const [width, height] = [image.get_width(), image.get_height()];
    if (!(width > 0 && height > 0)) throw broken();
    if (width * height > MOST_HEIC_PIXELS) {
      throw new HeicProblem(
        `The HEIC photo has ${Math.round((width * height) / 1e6)} megapixels; at most ${MOST_HEIC_PIXELS / 1e6} are taken. Choose a lower resolution.`,
      );
    }
    const into = { data: new Uint8ClampedArray(width * height * 4), width, height };
    const shown = await new Promise<{ data: Uint8ClampedArray } | null>((done) => image.display(into, done));
    if (!shown) throw broken();
    return { data: shown.data, width, height };
  } finally {
    for (const image of images) image.free();
  }
}

/** A decoded HEIC photo as JPEG at full size for preview and analysis: no metadata of the original is in it. */
export async function heicToJpeg(
  bytes: Uint8Array,
  openRaw: (data: Uint8ClampedArray, width: number, height: number) => Sharp,
): Promise<{ jpeg: Buffer; width: number; height: number }> {
  const { data, width, height } = await decodeHeic(bytes);
  const jpeg = await openRaw(data, width, height)
    .removeAlpha()
    .jpeg({ quality: 93, chromaSubsampling: '4:4:4' })
    .toBuffer();
  return { jpeg, width, height };
}
