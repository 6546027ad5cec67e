import type { View } from './camera';
import type { Exposure } from './photograph';
import { palettes, type Look, type PlateScene, type SceneLane, type SceneSpot } from './plate-scene';
import { seededRandom, type Random } from './random';
import { renderPlate, type RenderedPlate } from './render-plate';

export type PlateCase = {
  name: string;
  scene: PlateScene;
  view: View | 'plate fills the photo';
  exposure: Exposure;
  orientation: number;
};

const looks: readonly Look[] = ['uv-254', 'uv-254', 'permanganate', 'anisaldehyde', 'uv-366'];
const sizesMm = [
  [50, 100],
  [100, 100],
  [40, 80],
  [50, 75],
  [25, 75],
  [200, 100],
] as const;

/** Spots of one lane, far enough apart to be two to the eye. */
function inventSpots(random: Random, look: Look, sigmaMm: number, developedMm: number): SceneSpot[] {
  const spots: SceneSpot[] = [];
  for (let tries = random.whole(1, 4); tries > 0; tries -= 1) {
    const rf = random.between(0.06, 0.94);
    const size = sigmaMm * random.between(0.8, 1.2);
    if (spots.some((s) => Math.abs(s.rf - rf) * developedMm < 4.5 * size)) continue;
    spots.push({
      rf,
      sigmaMm: size,
      strength: random.chance(0.25) ? random.between(0.1, 0.25) : random.between(0.25, 0.9),
      colour: random.pick(palettes[look].spots),
    });
  }
  return spots;
}

/**
 * Case number `index` of an endless set: every fifth is without spots; straight, tilted and curved fronts,
 * tilts up to 25 degrees, all orientations and every kind of dirt come up in turn. `longPx` is the long side.
 */
export function plateCase(index: number, longPx: number): PlateCase {
  const random = seededRandom(1000 + index);
  const look = looks[index % looks.length]!;
  const many = index % 9 === 4;
  const blank = index % 6 === 5;
  const [widthMm, heightMm] = many ? ([random.pick([150, 200]), 100] as const) : sizesMm[index % 5]!;
  const baseY = heightMm * random.between(0.85, 0.9);
  const baseTilt = random.between(-0.02, 0.02) * widthMm;
  const frontY = heightMm * random.between(0.08, 0.16);
  const frontTilt = random.between(-0.03, 0.03) * widthMm;
  const sag = index % 3 === 0 ? 0 : random.between(-0.04, 0.04) * heightMm;
  const points = index % 3 === 0 ? 2 : index % 3 === 1 ? 3 : 5;
  const margin = widthMm * random.pick([0, 0.02, 0.05]);
  const frontMm = Array.from({ length: points }, (_, i) => {
    const share = i / (points - 1);
    return {
      x: margin + share * (widthMm - 2 * margin),
      y: frontY + frontTilt * (share - 0.5) + sag * (1 - (2 * share - 1) ** 2),
    };
  });
  const laneCount = many ? random.whole(18, 25) : random.whole(1, Math.max(2, Math.min(7, widthMm / 9)));
  const pitchMm = widthMm / (laneCount + 1);
  const sigmaMm = Math.min(random.between(0.9, 1.7), pitchMm / 4.8);
  const lanes: SceneLane[] = Array.from({ length: laneCount }, (_, i) => ({
    xMm: pitchMm * (i + 1) + random.between(-0.08, 0.08) * pitchMm,
    spots: blank ? [] : inventSpots(random, look, sigmaMm, baseY - frontY),
  }));
  if (index % 7 === 3 && lanes[0]!.spots[0])
    lanes[0]!.spots = [{ ...lanes[0]!.spots[0], rf: 0.6, strength: 0.7, tailMm: 6 }];
  const scene: PlateScene = {
    seed: index,
    look,
    widthMm,
    heightMm,
    baselineMm: [
      { x: margin, y: baseY - baseTilt / 2 },
      { x: widthMm - margin, y: baseY + baseTilt / 2 },
    ],
    frontMm,
    lanes,
    frontJagMm: index % 4 === 2 ? 0.3 : 0.03,
    originMarks: index % 2 === 0,
    handwriting: index % 3 !== 1,
    dust: index % 2 === 1 ? 25 : 4,
    scratches: index % 5 === 2 ? 3 : 0,
    table: tableOf(random, look),
  };
  const landscape = widthMm > heightMm * 1.1;
  const [width, height] = landscape
    ? [longPx, Math.round(longPx * 0.75)]
    : [Math.round(longPx * 0.75), longPx];
  const view =
    index % 13 === 7
      ? ('plate fills the photo' as const)
      : {
          tiltDeg: random.between(0, 25),
          leanDeg: random.between(0, 360),
          rollDeg: random.between(-7, 7),
          fill: random.between(0.7, 0.96),
        };
  const exposure = {
    width,
    height,
    unevenLight: random.between(0, 0.4),
    lightDeg: random.between(0, 360),
    noise: random.between(1.5, 5),
    blurPx: random.between(0, 1.2) * (longPx / 1000),
    quality: random.whole(75, 92),
  };
  const name = `${index} ${look} ${widthMm}x${heightMm} mm, ${laneCount} lanes${blank ? ', blank' : ''}`;
  return { name, scene, view, exposure, orientation: 1 + (index % 8) };
}

function tableOf(random: Random, look: Look) {
  if (look === 'uv-254' || look === 'uv-366') return palettes[look].table;
  return random.pick([palettes[look].table, [70, 72, 78], [178, 140, 98], [250, 250, 250]] as const);
}

export function renderCase(one: PlateCase): Promise<RenderedPlate> {
  return renderPlate(one.scene, one.view, one.exposure, one.orientation);
}
