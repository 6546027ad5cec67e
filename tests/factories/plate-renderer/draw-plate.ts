import { blend, newCanvas, type Canvas } from './canvas';
import { drawMarks } from './draw-marks';
import { curveAt, palettes, spotMm, type PlateScene, type SceneLane, type SceneSpot } from './plate-scene';
import { seededRandom, type Random } from './random';

/** The coarse grain of the layer: bilinear noise on a grid, a share of the ground. */
function grain(canvas: Canvas, pxPerMm: number, random: Random, share: number) {
  const cell = 1.6 * pxPerMm;
  const columns = Math.ceil(canvas.width / cell) + 2;
  const rows = Math.ceil(canvas.height / cell) + 2;
  const grid = Float32Array.from({ length: columns * rows }, () => random.normal());
  for (let y = 0; y < canvas.height; y += 1) {
    for (let x = 0; x < canvas.width; x += 1) {
      const i = Math.floor(x / cell);
      const k = Math.floor(y / cell);
      const u = x / cell - i;
      const v = y / cell - k;
      const at = k * columns + i;
      const value =
        (grid[at]! * (1 - u) + grid[at + 1]! * u) * (1 - v) +
        (grid[at + columns]! * (1 - u) + grid[at + columns + 1]! * u) * v;
      const pixel = (y * canvas.width + x) * 3;
      for (let c = 0; c < 3; c += 1) canvas.data[pixel + c]! *= 1 + share * value;
    }
  }
}

/** The colour that a spot turns the ground into. */
export function spotColour(scene: PlateScene, spot: SceneSpot) {
  return spot.colour ?? palettes[scene.look].spots[0]!;
}

function drawSpot(canvas: Canvas, pxPerMm: number, scene: PlateScene, lane: SceneLane, spot: SceneSpot) {
  const centre = spotMm(scene, lane, spot);
  const x = centre.x * pxPerMm - 0.5;
  const y = centre.y * pxPerMm - 0.5;
  const sigma = spot.sigmaMm * pxPerMm;
  const tail = (spot.tailMm ?? 0) * pxPerMm;
  const box = {
    left: x - 4 * sigma,
    right: x + 4 * sigma,
    top: y - 4 * sigma,
    bottom: y + 4 * sigma + 3 * tail,
  };
  blend(canvas, box, spotColour(scene, spot), (u, v) => {
    const across = (u - x) / sigma;
    const along = (v - y) / sigma;
    const body = Math.exp(-0.5 * (across * across + along * along));
    // The tail falls away from the centre towards the baseline, as an overloaded spot does.
    const trail = tail > 0 && v > y ? Math.exp(-0.5 * across * across - (v - y) / tail) : 0;
    return spot.strength * Math.max(body, trail);
  });
}

/** Draws a plate seen from straight above, so many pixels a mm. */
export function drawPlate(scene: PlateScene, pxPerMm: number): Canvas {
  const random = seededRandom(scene.seed + 77);
  const canvas = newCanvas(Math.round(scene.widthMm * pxPerMm), Math.round(scene.heightMm * pxPerMm));
  const { ground } = palettes[scene.look];
  for (let x = 0; x < canvas.width; x += 1) {
    const front = curveAt(scene.frontMm, (x + 0.5) / pxPerMm) * pxPerMm;
    for (let y = 0; y < canvas.height; y += 1) {
      // The dry layer above the front is a shade paler.
      const shade = y < front ? 1.015 : 1;
      for (let c = 0; c < 3; c += 1) canvas.data[(y * canvas.width + x) * 3 + c] = ground[c]! * shade;
    }
  }
  grain(canvas, pxPerMm, random, 0.008);
  for (const lane of scene.lanes) for (const spot of lane.spots) drawSpot(canvas, pxPerMm, scene, lane, spot);
  drawMarks({ canvas, pxPerMm, random, scene });
  return canvas;
}
