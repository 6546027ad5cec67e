/** Solves the small symmetric normal equations by Gauss elimination with pivoting. */
function solve(matrix: number[][], right: number[]): number[] {
  const n = right.length;
  for (let c = 0; c < n; c++) {
    let pivot = c;
    for (let r = c + 1; r < n; r++) if (Math.abs(matrix[r]![c]!) > Math.abs(matrix[pivot]![c]!)) pivot = r;
    [matrix[c], matrix[pivot]] = [matrix[pivot]!, matrix[c]!];
    [right[c], right[pivot]] = [right[pivot]!, right[c]!];
    for (let r = c + 1; r < n; r++) {
      const factor = matrix[r]![c]! / matrix[c]![c]!;
      for (let k = c; k < n; k++) matrix[r]![k]! -= factor * matrix[c]![k]!;
      right[r]! -= factor * right[c]!;
    }
  }
  const x = new Array<number>(n).fill(0);
  for (let r = n - 1; r >= 0; r--) {
    let sum = right[r]!;
    for (let k = r + 1; k < n; k++) sum -= matrix[r]![k]! * x[k]!;
    x[r] = sum / matrix[r]![r]!;
  }
  return x;
}

/** Weights of the smoothed middle point of a window (odd) for a polynomial of the given order. */
export function savitzkyGolayWeights(windowPoints: number, order: number): Float64Array {
  const half = (windowPoints - 1) / 2;
  const size = order + 1;
  const matrix = Array.from({ length: size }, (_, r) =>
    Array.from({ length: size }, (_, c) => {
      let sum = 0;
      for (let k = -half; k <= half; k++) sum += (k / half) ** (r + c);
      return sum;
    }),
  );
  const coefficients = solve(matrix, [1, ...new Array<number>(order).fill(0)]);
  const weights = new Float64Array(windowPoints);
  for (let k = -half; k <= half; k++) {
    let sum = 0;
    for (let p = 0; p < size; p++) sum += coefficients[p]! * (k / half) ** p;
    weights[k + half] = sum;
  }
  return weights;
}

/**
 * Savitzky-Golay smoothing (Anal. Chem. 36 (1964) 1627). The window shrinks towards both ends, so the number
 * of points stays. Returns a new array.
 */
export function smoothSavitzkyGolay(signal: Float64Array, windowPoints: number, order: number): Float64Array {
  const smoothed = Float64Array.from(signal);
  const half = (windowPoints - 1) / 2;
  const weights = savitzkyGolayWeights(windowPoints, order);
  for (let i = half; i < signal.length - half; i++) {
    let sum = 0;
    for (let k = 0; k < windowPoints; k++) sum += weights[k]! * signal[i - half + k]!;
    smoothed[i] = sum;
  }
  for (let edge = Math.ceil((order + 1) / 2); edge < half; edge++) {
    const near = savitzkyGolayWeights(2 * edge + 1, order);
    for (const i of [edge, signal.length - 1 - edge]) {
      if (i < edge || i + edge >= signal.length) continue;
      let sum = 0;
      for (let k = -edge; k <= edge; k++) sum += near[k + edge]! * signal[i + k]!;
      smoothed[i] = sum;
    }
  }
  return smoothed;
}
