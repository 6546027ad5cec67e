import type { Colour } from './plate-scene';

/** A picture in levels 0 to 255, three floats a pixel. */
export type Canvas = { width: number; height: number; data: Float32Array };

export function newCanvas(width: number, height: number): Canvas {
  return { width, height, data: new Float32Array(width * height * 3) };
}

/** Turns pixels of a rectangle towards a colour by the share that `cover` gives for pixel centres. */
export function blend(
  canvas: Canvas,
  box: { left: number; top: number; right: number; bottom: number },
  colour: Colour,
  cover: (x: number, y: number) => number,
) {
  const right = Math.min(canvas.width - 1, Math.ceil(box.right));
  const bottom = Math.min(canvas.height - 1, Math.ceil(box.bottom));
  for (let y = Math.max(0, Math.floor(box.top)); y <= bottom; y += 1) {
    for (let x = Math.max(0, Math.floor(box.left)); x <= right; x += 1) {
      const share = cover(x, y);
      if (share <= 0.001) continue;
      const at = (y * canvas.width + x) * 3;
      for (let c = 0; c < 3; c += 1) canvas.data[at + c]! += share * (colour[c]! - canvas.data[at + c]!);
    }
  }
}

/** A stroke with soft edges along a chain of points, all in pixels. */
export function stroke(
  canvas: Canvas,
  chain: readonly { x: number; y: number }[],
  widthPx: number,
  colour: Colour,
  strength: (x: number, y: number) => number,
) {
  const reach = widthPx / 2 + 1;
  for (let i = 1; i < chain.length; i += 1) {
    const a = chain[i - 1]!;
    const b = chain[i]!;
    const length = Math.max(1e-6, (b.x - a.x) ** 2 + (b.y - a.y) ** 2);
    const last = i === chain.length - 1;
    blend(
      canvas,
      {
        left: Math.min(a.x, b.x) - reach,
        right: Math.max(a.x, b.x) + reach,
        top: Math.min(a.y, b.y) - reach,
        bottom: Math.max(a.y, b.y) + reach,
      },
      colour,
      (x, y) => {
        const along = ((x - a.x) * (b.x - a.x) + (y - a.y) * (b.y - a.y)) / length;
        // Each piece covers its own stretch only, so that joints are not drawn twice.
        if (along < 0 || (along >= 1 && !last) || along > 1) return 0;
        const off = Math.hypot(x - a.x - along * (b.x - a.x), y - a.y - along * (b.y - a.y));
        const share = Math.min(1, Math.max(0, widthPx / 2 + 0.5 - off)) * Math.min(1, widthPx);
        return share * strength(x, y);
      },
    );
  }
}
