import { invalidField } from '@/lib/errors';

const dayMs = 86_400_000;
const earliest = Date.UTC(1950, 0, 1);

/** 422 for a time that no bench clock shows: before 1950 or more than a day ahead. */
export function requirePlausibleTime(path: string, at: Date): void {
  if (at.getTime() < earliest) throw invalidField(path, 'This time is before 1950: check the year.');
  if (at.getTime() > Date.now() + dayMs) {
    throw invalidField(path, 'This time is more than a day ahead: check the date and the clock.');
  }
}

/** Start and end of a run: both plausible, and in this order. */
export function requireRunTimes(startedAt: Date, endedAt: Date | null): void {
  requirePlausibleTime('startedAt', startedAt);
  if (!endedAt) return;
  requirePlausibleTime('endedAt', endedAt);
  if (endedAt < startedAt) throw invalidField('endedAt', 'The run ends before it starts: check both times.');
}
