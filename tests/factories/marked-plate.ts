import { randomBytes } from 'node:crypto';
import type { Agent } from '../support/test-server';
import type { View } from './plate-renderer/camera';
import type { PlateScene } from './plate-renderer/plate-scene';
import { type RenderedPlate, renderPlate } from './plate-renderer/render-plate';

/** An invented plate of 50 x 100 mm with a tilted baseline and a curved front. */
export const tiltedScene: PlateScene = {
  seed: 7,
  look: 'uv-254',
  widthMm: 50,
  heightMm: 100,
  baselineMm: [
    { x: 0, y: 88.5 },
    { x: 50, y: 86.5 },
  ],
  frontMm: [
    { x: 0, y: 14 },
    { x: 12.5, y: 12.2 },
    { x: 25, y: 11.6 },
    { x: 37.5, y: 12.2 },
    { x: 50, y: 14 },
  ],
  lanes: [
    {
      xMm: 8,
      spots: [
        { rf: 0.32, sigmaMm: 1.2, strength: 0.7 },
        { rf: 0.7, sigmaMm: 1.2, strength: 0.6 },
      ],
    },
    { xMm: 17, spots: [{ rf: 0.32, sigmaMm: 1.2, strength: 0.7 }] },
    { xMm: 26, spots: [{ rf: 0.7, sigmaMm: 1.2, strength: 0.18 }] },
    { xMm: 35, spots: [{ rf: 0.7, sigmaMm: 1.2, strength: 0.5 }] },
    { xMm: 43, spots: [] },
  ],
};

export const views: Record<'tilted' | 'otherwise', View> = {
  tilted: { tiltDeg: 24, leanDeg: 40, rollDeg: 5, fill: 0.85 },
  otherwise: { tiltDeg: 18, leanDeg: 200, rollDeg: -6, fill: 0.8 },
};

export function photographPlate(scene: PlateScene, view: View): Promise<RenderedPlate> {
  const exposure = {
    width: 900,
    height: 1200,
    unevenLight: 0.2,
    lightDeg: 30,
    noise: 2,
    blurPx: 0.6,
    quality: 90,
  };
  return renderPlate(scene, view, exposure);
}

/** Sends a photo, made unique by a few bytes after its end, and answers its id. */
export async function sendPlatePhoto(agent: Agent, runCode: string, jpeg: Buffer): Promise<string> {
  const { body } = await agent
    .post(`/api/v1/evidence?run=${runCode}&kind=plate-photo`)
    .set('Content-Type', 'image/jpeg')
    .set('X-Filename', 'plate.jpg')
    .send(Buffer.concat([jpeg, randomBytes(8)]))
    .expect(201);
  return body.evidence.id as string;
}

/** The marks of one who sees everything where it truly lies: front through five of its points. */
export function trueMarks({ truth }: RenderedPlate) {
  return {
    units: 'px' as const,
    corners: truth.corners,
    baseline: truth.baseline,
    front: truth.front.filter((_, i) => i % 2 === 0),
    lanes: truth.lanes.map((lane) => ({
      x: lane.x,
      spots: lane.spots.map(({ x, y }) => ({ x, y })),
    })),
  };
}
