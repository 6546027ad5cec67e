export type RangeStep = 'in' | 'out' | 'earlier' | 'later' | 'all';
type Range = { fromMin: number; toMin: number };

/** The next part of a trace to show: half or double the width about its middle, half a width to a side, or all of it. */
export function nextRange(shown: Range, whole: Range, step: RangeStep): Range {
  if (step === 'all') return whole;
  const wholeWidth = whole.toMin - whole.fromMin;
  const width = Math.min(
    wholeWidth,
    (shown.toMin - shown.fromMin) * (step === 'in' ? 0.5 : step === 'out' ? 2 : 1),
  );
  const middle =
    (shown.fromMin + shown.toMin) / 2 + (step === 'earlier' ? -width / 2 : step === 'later' ? width / 2 : 0);
  const fromMin = Math.min(Math.max(middle - width / 2, whole.fromMin), whole.toMin - width);
  return { fromMin, toMin: fromMin + width };
}
