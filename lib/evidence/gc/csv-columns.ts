import type { CsvLayout } from './csv-layout';

export type TimeUnit = 's' | 'min' | 'ms' | 'h';

const timeWords = /\b(time|zeit|temps|tiempo|tempo|rt|minutes?|seconds?|min|sec|x)\b/i;
const signalWords =
  /(signal|intensit|response|detector|fid|tcd|tic|abundance|counts?|volt|\bm?v\b|\bpa\b|µv|\buv\b|height|value|\by\b|int\b)/i;
const indexWords = /^(#|no\.?|nr\.?|index|idx|point|scan|n|i|row)$/i;

/** Column by a number from 0, or by its name (case does not matter); -1 when there is none. */
export function findColumn(columns: string[], wanted: number | string): number {
  if (typeof wanted === 'number')
    return Number.isInteger(wanted) && wanted >= 0 && wanted < columns.length ? wanted : -1;
  return columns.findIndex((name) => name.toLowerCase() === wanted.trim().toLowerCase());
}

/** Unit of time that a piece of heading tells, or null. */
export function timeUnitIn(text: string): TimeUnit | null {
  if (/\b(ms|msec|milliseconds?)\b/i.test(text)) return 'ms';
  if (/\b(min|mins|minutes?|minuten?|minutos?|minuti)\b/i.test(text)) return 'min';
  if (/\b(s|sec|secs|seconds?|sekunden?|secondes?|segundos?)\b/i.test(text)) return 's';
  if (/\b(h|hr|hrs|hours?|stunden?|heures?)\b/i.test(text)) return 'h';
  return null;
}

/** Chooses time and signal column by the words of the heading, else the first two that are no mere index. */
export function guessColumns(layout: CsvLayout): { time: number; signal: number; byName: boolean } {
  const { columns } = layout;
  if (!layout.named) return { time: 0, signal: Math.min(1, columns.length - 1), byName: false };
  const timeNamed = columns.findIndex((name) => timeWords.test(name) && !indexWords.test(name));
  const withUnit = columns.findIndex((name) => timeUnitIn(name) !== null);
  const firstReal = columns.findIndex((name) => !indexWords.test(name));
  const time =
    timeNamed >= 0 ? timeNamed : withUnit >= 0 ? withUnit : Math.max(0, columns.length > 2 ? firstReal : 0);
  const signalNamed = columns.findIndex(
    (name, k) => k !== time && signalWords.test(name) && !timeWords.test(name),
  );
  const next = columns.findIndex((name, k) => k > time && !indexWords.test(name));
  const other = columns.findIndex((_, k) => k !== time);
  return {
    time,
    signal: signalNamed >= 0 ? signalNamed : next >= 0 ? next : Math.max(0, other),
    byName: timeNamed >= 0 || withUnit >= 0,
  };
}

/**
 * Unit of time where no heading tells it, from the length of the run: gas chromatograms last from a minute to a few hours, so
 * an end over 200 is read as seconds (over 20,000 as milliseconds). An assumption, marked as such by the caller.
 */
export function assumeTimeUnit(lastTime: number): TimeUnit {
  if (lastTime > 20_000) return 'ms';
  return lastTime > 200 ? 's' : 'min';
}

/** Minutes in one unit of time. */
export const minutesIn: Record<TimeUnit, number> = { ms: 1 / 60_000, s: 1 / 60, min: 1, h: 60 };
