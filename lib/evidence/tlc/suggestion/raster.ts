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

/** The middle value (the lower of two middle ones); NaN of nothing. */
export function median(values: Float32Array): number {
  return Float32Array.from(values).sort()[(values.length - 1) >> 1] ?? NaN;
}

/** Standard deviation of the bulk: 1.4826 times the median absolute deviation, from at most 4096 values. */
export function robustSpread(values: Float32Array): { middle: number; spread: number } {
  const step = Math.max(1, Math.floor(values.length / 4096));
  const some = new Float32Array(Math.floor(values.length / step));
  for (let i = 0; i < some.length; i += 1) some[i] = values[i * step]!;
  const middle = median(some);
  return { middle, spread: 1.4826 * median(some.map((v) => Math.abs(v - middle))) };
}
