/** A photo as decoded: three bytes a pixel, row by row from the top left. */
export type RawPhoto = { data: Uint8Array; width: number; height: number };

/** One number a pixel, row by row. */
export type Raster = { width: number; height: number; data: Float32Array };

export function newRaster(width: number, height: number): Raster {
  return { width, height, data: new Float32Array(width * height) };
}

/** Means of square blocks of a photo; what is left over at the right and bottom edge is dropped. */
export function reducePhoto(photo: RawPhoto, factor: number): RawPhoto {
  if (factor <= 1) return photo;
  const width = Math.floor(photo.width / factor);
  const height = Math.floor(photo.height / factor);
  const data = new Uint8Array(width * height * 3);
  const area = factor * factor;
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      let [r, g, b] = [0, 0, 0];
      for (let v = 0; v < factor; v += 1) {
        let at = ((y * factor + v) * photo.width + x * factor) * 3;
        for (let u = 0; u < factor; u += 1) {
          r += photo.data[at]!;
          g += photo.data[at + 1]!;
          b += photo.data[at + 2]!;
          at += 3;
        }
      }
      const to = (y * width + x) * 3;
      data[to] = r / area + 0.5;
      data[to + 1] = g / area + 0.5;
      data[to + 2] = b / area + 0.5;
    }
  }
  return { data, width, height };
}

/** Means of blocks of two by two. */
export function halve(from: Raster): Raster {
  const to = newRaster(from.width >> 1, from.height >> 1);
  for (let y = 0; y < to.height; y += 1) {
    let at = 2 * y * from.width;
    for (let x = 0; x < to.width; x += 1, at += 2) {
      to.data[y * to.width + x] =
        (from.data[at]! +
          from.data[at + 1]! +
          from.data[at + from.width]! +
          from.data[at + from.width + 1]!) /
        4;
    }
  }
  return to;
}

/**
 * The middle value (the lower of two middle ones) of the first `count` values, which are left in another order;
 * NaN of nothing. Selection by parting (C. A. R. Hoare, Commun. ACM 4, 321 (1961)), far quicker than sorting.
 */
export function takeMedian(values: Float32Array, count = values.length): number {
  if (count === 0) return NaN;
  const middle = (count - 1) >> 1;
  let [low, high] = [0, count - 1];
  while (low < high) {
    const pivot = values[(low + high) >> 1]!;
    let [i, k] = [low, high];
    while (i <= k) {
      while (values[i]! < pivot) i += 1;
      while (values[k]! > pivot) k -= 1;
      if (i > k) break;
      const swap = values[i]!;
      values[i] = values[k]!;
      values[k] = swap;
      i += 1;
      k -= 1;
    }
    if (middle <= k) high = k;
    else if (middle >= i) low = i;
    else break;
  }
  return values[middle]!;
}

/** Standard deviation of the bulk: 1.4826 times the median absolute deviation, from at most 4096 values. */
export function robustSpread(values: Float32Array): { middle: number; spread: number } {
  const step = Math.max(1, Math.floor(values.length / 4096));
  const some = new Float32Array(Math.floor(values.length / step));
  for (let i = 0; i < some.length; i += 1) some[i] = values[i * step]!;
  const middle = takeMedian(some);
  for (let i = 0; i < some.length; i += 1) some[i] = Math.abs(some[i]! - middle);
  return { middle, spread: 1.4826 * takeMedian(some) };
}
