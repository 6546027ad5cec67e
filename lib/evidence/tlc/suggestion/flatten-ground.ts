import { newRaster, takeMedian, type Raster } from './raster';

/** Cells across the shorter and the longer side into which the plate is divided. */
const CELL_SHARE = 0.036;
/** Cells to each side whose medians are taken together: wider than any spot, narrower than the light's changes. */
const NEIGHBOURS = 3;

/**
 * A channel less its ground. The ground at a place is the median of the medians of small cells about it, so that
 * spots and lines, which cover less than half of any neighbourhood, leave it as it is; between cells it runs
 * straight. A layer that is lit unevenly, or darker at one end, comes out level.
 */
export function flattenGround(channel: Raster): Raster {
  const { width, height } = channel;
  const cell = Math.max(4, Math.round(CELL_SHARE * Math.sqrt(width * height)));
  const columns = Math.max(1, Math.round(width / cell));
  const rows = Math.max(1, Math.round(height / cell));
  const medians = cellMedians(channel, columns, rows);
  const ground = new Float32Array(columns * rows);
  const near = new Float32Array((2 * NEIGHBOURS + 1) ** 2);
  for (let k = 0; k < rows; k += 1) {
    for (let i = 0; i < columns; i += 1) {
      let count = 0;
      for (let v = -NEIGHBOURS; v <= NEIGHBOURS; v += 1) {
        const row = mirrored(k, v, rows) * columns;
        for (let u = -NEIGHBOURS; u <= NEIGHBOURS; u += 1, count += 1)
          near[count] = medians[row + mirrored(i, u, columns)]!;
      }
      ground[k * columns + i] = takeMedian(near, count);
    }
  }
  return subtract(channel, ground, columns, rows);
}

/**
 * A neighbour's index; where it lies off the plate, so does its opposite count, and the place itself stands in
 * for both: a slope of light keeps its middle value up to the edge.
 */
function mirrored(at: number, step: number, count: number): number {
  const reach = Math.min(at, count - 1 - at);
  return Math.abs(step) > reach ? at : at + step;
}

function cellMedians(channel: Raster, columns: number, rows: number): Float32Array {
  const { width, height, data } = channel;
  const medians = new Float32Array(columns * rows);
  const values = new Float32Array((Math.ceil(height / rows) + 1) * (Math.ceil(width / columns) + 1));
  for (let k = 0; k < rows; k += 1) {
    const [top, bottom] = [Math.floor((k * height) / rows), Math.floor(((k + 1) * height) / rows)];
    for (let i = 0; i < columns; i += 1) {
      const [left, right] = [Math.floor((i * width) / columns), Math.floor(((i + 1) * width) / columns)];
      let count = 0;
      for (let y = top; y < bottom; y += 1)
        for (let x = left; x < right; x += 1, count += 1) values[count] = data[y * width + x]!;
      medians[k * columns + i] = takeMedian(values, count);
    }
  }
  return medians;
}

/** The channel less the ground, which runs straight between the middles of the cells and on beyond the outer ones. */
function subtract(channel: Raster, ground: Float32Array, columns: number, rows: number): Raster {
  const { width, height, data } = channel;
  const flat = newRaster(width, height);
  for (let y = 0; y < height; y += 1) {
    const v = ((y + 0.5) * rows) / height - 0.5;
    const k = Math.max(0, Math.min(rows - 2, Math.floor(v)));
    const down = rows > 1 ? v - k : 0;
    const below = rows > 1 ? columns : 0;
    for (let x = 0; x < width; x += 1) {
      const u = ((x + 0.5) * columns) / width - 0.5;
      const i = Math.max(0, Math.min(columns - 2, Math.floor(u)));
      const right = columns > 1 ? u - i : 0;
      const beside = columns > 1 ? 1 : 0;
      const at = k * columns + i;
      const upper = ground[at]! + right * (ground[at + beside]! - ground[at]!);
      const lower = ground[at + below]! + right * (ground[at + below + beside]! - ground[at + below]!);
      flat.data[y * width + x] = data[y * width + x]! - upper - down * (lower - upper);
    }
  }
  return flat;
}
