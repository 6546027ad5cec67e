import type { Raster } from './raster';

export type SpotShape = {
  /** Standard deviations along the longer and the shorter axis, pixels. */
  major: number;
  minor: number;
  /** 0: the long axis runs along the development; 1: across it. */
  slant: number;
};

/**
 * Second moments of what rises above 30 % of the height at the centre, within `radius` pixels. A round spot has
 * two like axes, a scratch a short one, a streak a long one along the development.
 */
export function measureShape(smooth: Raster, x: number, y: number, radius: number): SpotShape {
  const { width, height, data } = smooth;
  const peak = data[Math.floor(y) * width + Math.floor(x)]!;
  const floor = 0.3 * peak;
  let [w, wx, wy, wxx, wyy, wxy] = [0, 0, 0, 0, 0, 0];
  for (let v = Math.max(0, Math.ceil(y - radius)); v < Math.min(height, y + radius); v += 1) {
    for (let u = Math.max(0, Math.ceil(x - radius)); u < Math.min(width, x + radius); u += 1) {
      const weight = data[v * width + u]! - floor;
      const [dx, dy] = [u + 0.5 - x, v + 0.5 - y];
      if (weight <= 0 || dx * dx + dy * dy > radius * radius) continue;
      w += weight;
      wx += weight * dx;
      wy += weight * dy;
      wxx += weight * dx * dx;
      wyy += weight * dy * dy;
      wxy += weight * dx * dy;
    }
  }
  if (w <= 0) return { major: 0, minor: 0, slant: 0 };
  const xx = wxx / w - (wx / w) ** 2;
  const yy = wyy / w - (wy / w) ** 2;
  const xy = wxy / w - (wx * wy) / (w * w);
  const root = Math.hypot((xx - yy) / 2, xy);
  const mean = (xx + yy) / 2;
  const angle = 0.5 * Math.atan2(2 * xy, xx - yy);
  return {
    major: Math.sqrt(Math.max(0, mean + root)),
    minor: Math.sqrt(Math.max(0, mean - root)),
    slant: Math.abs(Math.cos(angle)),
  };
}

/** The highest point near a place, by climbing from pixel to pixel and then a parabola each way. */
export function climbToPeak(smooth: Raster, x: number, y: number, most: number): { x: number; y: number } {
  const { width, height, data } = smooth;
  let [u, v] = [Math.floor(x), Math.floor(y)];
  for (let step = 0; step < most; step += 1) {
    let [bestU, bestV] = [u, v];
    for (let dv = -1; dv <= 1; dv += 1) {
      for (let du = -1; du <= 1; du += 1) {
        const [nu, nv] = [u + du, v + dv];
        if (nu < 1 || nv < 1 || nu >= width - 1 || nv >= height - 1) continue;
        if (data[nv * width + nu]! > data[bestV * width + bestU]!) [bestU, bestV] = [nu, nv];
      }
    }
    if (bestU === u && bestV === v) break;
    [u, v] = [bestU, bestV];
  }
  const vertex = (before: number, here: number, after: number) => {
    const bend = before - 2 * here + after;
    return bend < -1e-9 ? Math.max(-0.5, Math.min(0.5, (0.5 * (before - after)) / bend)) : 0;
  };
  const at = v * width + u;
  const inner = u > 0 && v > 0 && u < width - 1 && v < height - 1;
  return {
    x: u + 0.5 + (inner ? vertex(data[at - 1]!, data[at]!, data[at + 1]!) : 0),
    y: v + 0.5 + (inner ? vertex(data[at - width]!, data[at]!, data[at + width]!) : 0),
  };
}
