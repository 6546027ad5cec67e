import { expect, it } from 'vitest';
import { profileShape } from './profile-shape';

it('draws Rf to the right and signal upwards, from edge to edge', () => {
  const shape = profileShape(
    { rf: [0, 0.5, 1], signal: [0, 10, 0], areas: [{ rf: 0.5, fromRf: 0.4, toRf: 0.6 }] },
    100,
    50,
    10,
  );
  expect(shape.path).toBe('M0.0 50.0L50.0 6.0L100.0 50.0');
  expect(shape.areas).toEqual([{ left: 40, right: 60, middle: 50 }]);
});

it('draws a lane without any signal as a flat line', () => {
  expect(profileShape({ rf: [0, 1], signal: [0, 0], areas: [] }, 100, 50, 0).path).toBe(
    'M0.0 50.0L100.0 50.0',
  );
});
