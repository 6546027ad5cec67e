import { expect, it } from 'vitest';
import { Problem } from '@/lib/errors';
import { decodeCursor, encodeCursor } from './paging';

const id = '01930b5e-7c00-7000-8000-000000000001';
const at = '2026-11-02T09:30:00.000Z';
const forged = (value: unknown) => Buffer.from(JSON.stringify(value)).toString('base64url');
const read = (cursor: string) => decodeCursor('-collectedAt', cursor, ['instant', 'id']);

it('gives back what a cursor was made of', () => {
  expect(read(encodeCursor('-collectedAt', [at, id]))).toEqual([at, id]);
  const written = '2026-11-02 09:30:00.000';
  expect(read(encodeCursor('-collectedAt', [written, id]))).toEqual([written, id]);
  const purity = encodeCursor('-purity', [null, id]);
  expect(decodeCursor('-purity', purity, ['number or none', 'id'])).toEqual([null, id]);
});

it.each([
  ['an object for a time', forged(['-collectedAt', { a: 1 }, id])],
  ['a list for a time', forged(['-collectedAt', [at], id])],
  ['true for a time', forged(['-collectedAt', true, id])],
  ['a day that is none', forged(['-collectedAt', '2026-99-99T00:00:00Z', id])],
  ['a text for an id', forged(['-collectedAt', at, 'x'])],
  ['a number for an id', forged(['-collectedAt', at, 5])],
  ['nothing for an id', forged(['-collectedAt', at])],
  ['a value too many', forged(['-collectedAt', at, id, 1])],
  ['another sort', forged(['code', at, id])],
  ['null', forged(null)],
  ['an object', forged({ 0: '-collectedAt' })],
  ['no JSON', 'abc'],
])('refuses %s as a cursor of another list', (_name, cursor) => {
  expect(() => read(cursor)).toThrow(Problem);
  expect(() => read(cursor)).toThrow('Start again without a cursor.');
});

it('takes only texts, numbers and null where only a count is known', () => {
  expect(decodeCursor('email', forged(['email', 'a@example.org']), 1)).toEqual(['a@example.org']);
  for (const value of [{ a: 1 }, [1], true, '\ud800'])
    expect(() => decodeCursor('email', forged(['email', value]), 1)).toThrow(Problem);
});
