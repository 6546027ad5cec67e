import type { Point } from '@/lib/evidence/tlc/polyline';
import { blend, stroke, type Canvas } from './canvas';
import { curveAt, palettes, type PlateScene } from './plate-scene';
import type { Random } from './random';

/** Strokes of handwritten figures in a box one wide and two high. */
const figures: readonly (readonly (readonly [number, number])[])[] = [
  [
    [0.5, 0],
    [0, 0.7],
    [0.1, 1.7],
    [0.6, 2],
    [1, 1.2],
    [0.9, 0.3],
    [0.5, 0],
  ],
  [
    [0.2, 0.5],
    [0.6, 0],
    [0.55, 2],
  ],
  [
    [0, 0.5],
    [0.4, 0],
    [1, 0.4],
    [0.7, 1.1],
    [0, 2],
    [1, 1.9],
  ],
  [
    [0, 0.2],
    [0.9, 0.1],
    [0.4, 0.9],
    [1, 1.4],
    [0.5, 2],
    [0, 1.7],
  ],
  [
    [0.7, 2],
    [0.7, 0],
    [0, 1.3],
    [1, 1.3],
  ],
  [
    [1, 0],
    [0.1, 0],
    [0, 0.9],
    [0.8, 0.9],
    [0.9, 1.6],
    [0, 2],
  ],
  [
    [0.8, 0],
    [0.1, 1],
    [0.2, 1.9],
    [0.9, 1.7],
    [0.8, 1.1],
    [0.1, 1.3],
  ],
  [
    [0, 0],
    [1, 0],
    [0.3, 2],
  ],
  [
    [0.5, 1],
    [0, 0.5],
    [0.5, 0],
    [1, 0.5],
    [0.5, 1],
    [0, 1.5],
    [0.5, 2],
    [1, 1.5],
    [0.5, 1],
  ],
  [
    [0.9, 0.7],
    [0.3, 0.9],
    [0.1, 0.3],
    [0.7, 0],
    [0.9, 0.7],
    [0.7, 2],
  ],
];

type Pen = { canvas: Canvas; pxPerMm: number; random: Random; scene: PlateScene };

/** A pencil stroke in mm: it fades and darkens as the graphite catches. */
function pencil({ canvas, pxPerMm, random, scene }: Pen, chainMm: readonly Point[], widthMm = 0.35) {
  const phase = random.between(0, 6);
  const scaled = chainMm.map((p) => ({ x: p.x * pxPerMm - 0.5, y: p.y * pxPerMm - 0.5 }));
  stroke(canvas, scaled, widthMm * pxPerMm, palettes[scene.look].pencil, (x, y) => {
    return 0.72 + 0.2 * Math.sin(phase + (x + y) / (1.7 * pxPerMm));
  });
}

function write(pen: Pen, text: string, x: number, y: number, heightMm: number) {
  [...text].forEach((letter, i) => {
    const shape = figures[Number(letter)]!;
    const tremble = () => pen.random.normal() * 0.04;
    const scale = heightMm / 2;
    pencil(
      pen,
      shape.map(([u, v]) => ({ x: x + (i * 1.4 + u + tremble()) * scale, y: y + (v + tremble()) * scale })),
    );
  });
}

/** Baseline, front, origin ticks and numbers, scratches and dust. */
export function drawMarks(pen: Pen) {
  const { scene, random, canvas, pxPerMm } = pen;
  const [left, right] = scene.baselineMm;
  pencil(pen, [left, right]);
  const steps = 80;
  const jag = scene.frontJagMm ?? 0;
  let wander = 0;
  const front = Array.from({ length: steps + 1 }, (_, i) => {
    const x = scene.frontMm[0]!.x + ((scene.frontMm.at(-1)!.x - scene.frontMm[0]!.x) * i) / steps;
    wander = 0.7 * wander + 0.71 * random.normal();
    return { x, y: curveAt(scene.frontMm, x) + jag * wander };
  });
  if (!scene.noFrontLine) pencil(pen, front);
  scene.lanes.forEach((lane, i) => {
    const y = curveAt(scene.baselineMm, lane.xMm);
    if (scene.originMarks)
      pencil(pen, [
        { x: lane.xMm, y: y - 0.9 },
        { x: lane.xMm, y: y + 0.9 },
      ]);
    const height = Math.min(4, (scene.heightMm - y) * 0.5);
    if (scene.handwriting)
      write(pen, String(i + 1), lane.xMm - height * 0.3, y + 0.25 * (scene.heightMm - y), height);
  });
  if (scene.handwriting) {
    const room = curveAt(scene.frontMm, scene.widthMm * 0.2);
    const height = Math.min(4, room * 0.5);
    write(pen, String(random.whole(10, 999)), scene.widthMm * 0.12, room * 0.2, height);
  }
  const { scratch } = palettes[scene.look];
  for (let i = 0; i < (scene.scratches ?? 0); i += 1) {
    const x = random.between(0.1, 0.9) * scene.widthMm;
    const y = random.between(0.25, 0.75) * scene.heightMm;
    const angle = random.between(0, Math.PI);
    const half = random.between(0.05, 0.14) * scene.heightMm;
    const end = (side: number) => ({
      x: (x + side * half * Math.cos(angle)) * pxPerMm,
      y: (y + side * half * Math.sin(angle)) * pxPerMm,
    });
    stroke(canvas, [end(-1), end(1)], random.between(0.15, 0.4) * pxPerMm, scratch, () => 0.8);
  }
  for (let i = 0; i < (scene.dust ?? 0); i += 1) {
    const x = random.between(0, scene.widthMm) * pxPerMm;
    const y = random.between(0, scene.heightMm) * pxPerMm;
    const radius = random.between(0.08, 0.3) * pxPerMm;
    const colour = random.chance(0.6) ? palettes[scene.look].pencil : scratch;
    const box = { left: x - radius - 1, right: x + radius + 1, top: y - radius - 1, bottom: y + radius + 1 };
    blend(
      canvas,
      box,
      colour,
      (u, v) => 0.8 * Math.min(1, Math.max(0, radius + 0.5 - Math.hypot(u - x, v - y))),
    );
  }
}
