import { expect, it } from 'vitest';
import { BoundedMap } from './bounded-map';

it('forgets the entry longest unused when it is full', () => {
  const map = new BoundedMap<string, number>(2);
  map.set('a', 1);
  map.set('b', 2);
  expect(map.get('a')).toBe(1);
  map.set('c', 3);
  expect(map.size).toBe(2);
  expect(map.get('b')).toBeUndefined();
  expect(map.get('a')).toBe(1);
  expect(map.get('c')).toBe(3);
});

it('replaces a value under its key without growing', () => {
  const map = new BoundedMap<string, number>(2);
  map.set('a', 1);
  map.set('a', 2);
  expect(map.size).toBe(1);
  expect(map.get('a')).toBe(2);
});

it('refuses a limit under one', () => {
  expect(() => new BoundedMap(0)).toThrow(RangeError);
});
