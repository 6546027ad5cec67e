export const leastZoom = 1;
export const mostZoom = 8;
const steps = [1, 1.5, 2, 3, 4, 6, 8];

export function clampZoom(zoom: number): number {
  return Math.min(mostZoom, Math.max(leastZoom, zoom));
}

/** The next round zoom in a direction; pinching leaves zooms between the round ones. */
export function stepZoom(zoom: number, by: 1 | -1): number {
  const near = 1e-6;
  const next =
    by > 0 ? steps.find((step) => step > zoom + near) : steps.filter((step) => step < zoom - near).at(-1);
  return next ?? clampZoom(zoom);
}

/** A place of the picture (shares of its size) that is to lie at a place of the frame (px from its corner). */
export type Anchor = { shareX: number; shareY: number; atX: number; atY: number };

type Finger = { clientX: number; clientY: number };

export function betweenFingers(a: Finger, b: Finger) {
  return {
    distance: Math.hypot(a.clientX - b.clientX, a.clientY - b.clientY),
    x: (a.clientX + b.clientX) / 2,
    y: (a.clientY + b.clientY) / 2,
  };
}
