import { expect, it } from 'vitest';
import { readRange } from './byte-range';

// RFC 9110, 14.1.2: the examples for a representation of 10,000 bytes.
it('reads the ranges of the standard', () => {
  expect(readRange('bytes=0-499', 10_000)).toEqual({ kind: 'part', first: 0, last: 499 });
  expect(readRange('bytes=500-999', 10_000)).toEqual({ kind: 'part', first: 500, last: 999 });
  expect(readRange('bytes=-500', 10_000)).toEqual({ kind: 'part', first: 9500, last: 9999 });
  expect(readRange('bytes=9500-', 10_000)).toEqual({ kind: 'part', first: 9500, last: 9999 });
});

it('cuts a range at the end and takes a suffix longer than the file as the whole of it', () => {
  expect(readRange('bytes=90-200', 100)).toEqual({ kind: 'part', first: 90, last: 99 });
  expect(readRange('bytes=-200', 100)).toEqual({ kind: 'part', first: 0, last: 99 });
});

it('cannot satisfy what begins beyond the end, nor a suffix of nothing', () => {
  expect(readRange('bytes=100-', 100)).toEqual({ kind: 'unsatisfiable' });
  expect(readRange('bytes=-0', 100)).toEqual({ kind: 'unsatisfiable' });
  expect(readRange('bytes=0-', 0)).toEqual({ kind: 'unsatisfiable' });
});

it('answers what it does not understand with the whole', () => {
  for (const header of [null, 'lines=1-2', 'bytes=5-2', 'bytes=0-1,5-6', 'bytes=-', 'bytes=a-b'])
    expect(readRange(header, 100)).toEqual({ kind: 'whole' });
});
