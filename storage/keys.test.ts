import { expect, it } from 'vitest';
import { objectKeyFor, sha256FromKey } from './keys';

// SHA-256 of the empty message: NIST, Cryptographic Algorithm Validation Program, SHA256ShortMsg.rsp, Len = 0.
const EMPTY = 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855';

it('derives a key from a digest and back', () => {
  expect(objectKeyFor(EMPTY)).toBe(`sha256/e3/b0/${EMPTY}`);
  expect(sha256FromKey(objectKeyFor(EMPTY))).toBe(EMPTY);
});

it.each(['', 'abc', EMPTY.toUpperCase(), `${EMPTY}0`, `../${EMPTY}`])('refuses %j as a digest', (text) => {
  expect(() => objectKeyFor(text)).toThrow(RangeError);
});

it.each(['', EMPTY, `sha256/e3/b1/${EMPTY}`, `sha256/e3/b0/${EMPTY}/x`])('refuses %j as a key', (text) => {
  expect(() => sha256FromKey(text)).toThrow(RangeError);
});
