/** A per cent without the binary dust of a sum: six decimals, and never over 100. */
export function cleanPercent(percent: number): number {
  return Math.min(100, Math.round(percent * 1e6) / 1e6);
}
