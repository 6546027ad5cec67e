import type { Point } from '@/lib/evidence/tlc/polyline';
import type { Trouble } from './troubles';

export type Colour = readonly [number, number, number];

/** How the plate was made visible: the colours of ground, pencil, table and spots that go with it. */
export type Look = 'uv-254' | 'permanganate' | 'anisaldehyde' | 'uv-366';

export type SceneSpot = {
  rf: number;
  /** One standard deviation across and along, mm. */
  sigmaMm: number;
  /** 0 to 1: how far the ground turns into the colour of the spot at its centre. */
  strength: number;
  /** Length of a tail towards the baseline, mm. */
  tailMm?: number;
  colour?: Colour;
};

export type SceneLane = { xMm: number; spots: SceneSpot[] };

/** A plate in mm, origin top left, y downwards; the solvent ran up. */
export type PlateScene = {
  seed: number;
  look: Look;
  widthMm: number;
  heightMm: number;
  baselineMm: readonly [Point, Point];
  /** 2 to 5 points of a smooth front. */
  frontMm: readonly Point[];
  lanes: SceneLane[];
  /** How far the drawn front wanders about the true one, mm. */
  frontJagMm?: number;
  originMarks?: boolean;
  /** Numbers under the baseline and a remark above the front. */
  handwriting?: boolean;
  dust?: number;
  scratches?: number;
  table?: Colour;
  /** The front was not marked. */
  noFrontLine?: boolean;
  troubles?: readonly Trouble[];
};

export type Palette = {
  ground: Colour;
  table: Colour;
  pencil: Colour;
  spots: readonly Colour[];
  scratch: Colour;
};

/** Invented but plausible colours, sRGB. */
export const palettes: Record<Look, Palette> = {
  'uv-254': {
    ground: [96, 205, 122],
    table: [34, 22, 58],
    pencil: [52, 108, 70],
    spots: [[24, 46, 52]],
    scratch: [60, 70, 110],
  },
  permanganate: {
    ground: [214, 158, 196],
    table: [120, 112, 104],
    pencil: [104, 84, 100],
    spots: [
      [226, 198, 92],
      [206, 172, 86],
    ],
    scratch: [238, 232, 236],
  },
  anisaldehyde: {
    ground: [236, 224, 208],
    table: [96, 80, 66],
    pencil: [128, 124, 120],
    spots: [
      [104, 60, 140],
      [70, 84, 160],
      [92, 128, 84],
      [142, 92, 58],
    ],
    scratch: [252, 250, 246],
  },
  'uv-366': {
    ground: [46, 34, 84],
    table: [14, 10, 26],
    pencil: [30, 24, 50],
    spots: [
      [160, 200, 250],
      [236, 232, 160],
    ],
    scratch: [24, 18, 40],
  },
};

/** The smooth curve through the points (Lagrange's polynomial): y at x. */
export function curveAt(points: readonly Point[], x: number): number {
  return points.reduce((sum, p, i) => {
    const weight = points.reduce((w, q, k) => (k === i ? w : (w * (x - q.x)) / (p.x - q.x)), 1);
    return sum + p.y * weight;
  }, 0);
}

/** Where a spot of the scene lies, mm. */
export function spotMm(scene: PlateScene, lane: SceneLane, spot: SceneSpot): Point {
  const base = curveAt(scene.baselineMm, lane.xMm);
  return { x: lane.xMm, y: base + spot.rf * (curveAt(scene.frontMm, lane.xMm) - base) };
}
