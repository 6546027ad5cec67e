/** Brands of ISO/IEC 23008-12 (HEIF), annex B, whose pictures are coded by HEVC. */
const hevcBrands = new Set(['heic', 'heix', 'heim', 'heis']);
/** Brands of AV1 pictures (AV1 Image File Format), which share the container. */
const av1Brands = new Set(['avif', 'avis', 'avio']);
/** The container without a word on the coding. */
const plainBrands = new Set(['mif1', 'mif2']);

/**
 * What kind of HEIF picture a file is, from the major and compatible brands in its file type box (ISO/IEC 14496-12,
 * 4.3), which comes first; null for anything else. `image/heic` is coded by HEVC, `image/heif` says nothing of its
 * coding. Pure.
 */
export function sniffHeif(bytes: Uint8Array): 'image/heic' | 'image/heif' | 'image/avif' | null {
  if (bytes.length < 16) return null;
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const text = (at: number) => String.fromCharCode(...bytes.subarray(at, at + 4));
  const boxLength = view.getUint32(0);
  if (text(4) !== 'ftyp' || boxLength < 16 || boxLength > 1024) return null;
  const brands = [text(8)];
  for (let at = 16; at + 4 <= Math.min(boxLength, bytes.length); at += 4) brands.push(text(at));
  if (av1Brands.has(brands[0]!)) return 'image/avif';
  if (brands.some((brand) => hevcBrands.has(brand))) return 'image/heic';
  if (brands.some((brand) => av1Brands.has(brand))) return 'image/avif';
  return brands.some((brand) => plainBrands.has(brand)) ? 'image/heif' : null;
}
