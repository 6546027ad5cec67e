/** What part of a file a `Range` header asks for. `last` is included. */
export type RangeAnswer =
  { kind: 'whole' } | { kind: 'part'; first: number; last: number } | { kind: 'unsatisfiable' };

/**
 * One byte range of RFC 9110, 14.1.2. What is not understood, and a list of several ranges, may be answered with the
 * whole (14.2); a range that begins beyond the end cannot be satisfied.
 */
export function readRange(header: string | null, sizeBytes: number): RangeAnswer {
  const match = header ? /^bytes=(\d*)-(\d*)$/.exec(header.replace(/\s+/g, '')) : null;
  if (!match || (match[1] === '' && match[2] === '')) return { kind: 'whole' };
  if (match[1] === '') {
    const wanted = Number(match[2]);
    if (wanted === 0 || sizeBytes === 0) return { kind: 'unsatisfiable' };
    return { kind: 'part', first: Math.max(0, sizeBytes - wanted), last: sizeBytes - 1 };
  }
  const first = Number(match[1]);
  const last = match[2] === '' ? sizeBytes - 1 : Math.min(Number(match[2]), sizeBytes - 1);
  if (match[2] !== '' && Number(match[2]) < first) return { kind: 'whole' };
  if (first >= sizeBytes) return { kind: 'unsatisfiable' };
  return { kind: 'part', first, last };
}
