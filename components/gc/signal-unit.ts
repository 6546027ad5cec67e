/** The unit of the signal as the heading of its column gives it, "Signal (pA)" or "FID1A [mV]"; else no unit is claimed. */
export function signalUnitOf(columns: readonly string[], signalColumn: number): string {
  const heading = columns[signalColumn] ?? '';
  const inBrackets = /[([]([^)\]]{1,12})[)\]]\s*$/.exec(heading)?.[1];
  if (inBrackets) return inBrackets.trim();
  const bare = /\b(pA|nA|mV|µV|uV|V|counts)\b/.exec(heading)?.[1];
  return bare ?? 'unit of the file';
}
