import { applyHomography } from '@/lib/evidence/tlc/homography';
import type { Point } from '@/lib/evidence/tlc/polyline';
import { requireMap, viewCorners, type View } from './camera';
import { drawPlate, spotColour } from './draw-plate';
import { encodeTurned, lightAt, photograph, type Exposure } from './photograph';
import { curveAt, palettes, spotMm, type PlateScene } from './plate-scene';

export type TrueSpot = Point & { rf: number; strength: number; contrastToNoise: number; streak: boolean };
export type PlateTruth = {
  width: number;
  height: number;
  corners: Point[];
  baseline: Point[];
  front: Point[];
  lanes: { x: number; y: number; spots: TrueSpot[] }[];
};
export type RenderedPlate = { jpeg: Buffer; truth: PlateTruth };

/**
 * A photo of an invented plate, and where everything on it truly lies, in pixels of the photo as shown (after its
 * EXIF orientation). `contrastToNoise` is the largest change that a spot makes in any channel at its centre, in
 * standard deviations of the noise of one pixel.
 */
export async function renderPlate(
  scene: PlateScene,
  view: View | 'plate fills the photo',
  exposure: Exposure,
  orientation = 1,
): Promise<RenderedPlate> {
  const { width, height } = exposure;
  const whole = [
    { x: 0, y: 0 },
    { x: width, y: 0 },
    { x: width, y: height },
    { x: 0, y: height },
  ];
  const corners = view === 'plate fills the photo' ? whole : viewCorners(scene, exposure, view);
  const pxPerMm = Math.hypot(corners[1]!.x - corners[0]!.x, corners[1]!.y - corners[0]!.y) / scene.widthMm;
  const plate = drawPlate(scene, pxPerMm);
  const drawn = [
    { x: 0, y: 0 },
    { x: plate.width, y: 0 },
    { x: plate.width, y: plate.height },
    { x: 0, y: plate.height },
  ];
  const toPlate = requireMap(corners, drawn);
  const toPhoto = requireMap(drawn, corners);
  const { table, ground } = palettes[scene.look];
  const pixels = await photograph(plate, toPlate, scene.table ?? table, exposure, { ...scene, corners });

  const scaleX = plate.width / scene.widthMm;
  const scaleY = plate.height / scene.heightMm;
  const place = (mm: Point) => applyHomography(toPhoto, { x: mm.x * scaleX, y: mm.y * scaleY });
  const [left, right] = [scene.frontMm[0]!.x, scene.frontMm.at(-1)!.x];
  const truth: PlateTruth = {
    width,
    height,
    corners,
    baseline: scene.baselineMm.map(place),
    front: Array.from({ length: 9 }, (_, i) => {
      const x = left + ((right - left) * i) / 8;
      return place({ x, y: curveAt(scene.frontMm, x) });
    }),
    lanes: scene.lanes.map((lane) => ({
      ...place({ x: lane.xMm, y: curveAt(scene.baselineMm, lane.xMm) }),
      spots: lane.spots.map((spot) => {
        const at = place(spotMm(scene, lane, spot));
        const colour = spotColour(scene, spot);
        const change = Math.max(...ground.map((level, c) => Math.abs(level - colour[c]!)));
        const seen = spot.strength * change * lightAt(exposure, at.x, at.y);
        const streak = (spot.tailMm ?? 0) > 0;
        const contrastToNoise = seen / Math.max(0.5, exposure.noise);
        return { ...at, rf: spot.rf, strength: spot.strength, contrastToNoise, streak };
      }),
    })),
  };
  return { jpeg: await encodeTurned(pixels, exposure, orientation), truth };
}
