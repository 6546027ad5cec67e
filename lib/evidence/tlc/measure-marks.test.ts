import { expect, it } from 'vitest';
import { measureMarks } from './measure-marks';

// b = 10, f = 60, s = 32 mm from the lower edge: Rf 0.44, u 0.0123 (propagation, JCGM 100:2008, 5.1.2).
const marks = {
  units: 'mm' as const,
  baseline: [{ x: 0, y: 90 }],
  front: [{ x: 0, y: 40 }],
  lanes: [{ spots: [{ x: 10, y: 68 }] }],
  extent: { width: 50, height: 100 },
};

it('computes Rf and its uncertainty for each spot', () => {
  const { lanes, problems, flags } = measureMarks(marks);
  expect(problems).toEqual([]);
  expect(flags).toEqual([]);
  expect(lanes[0]!.x).toBe(10);
  expect(lanes[0]!.spots[0]!.rf).toBeCloseTo(0.44, 10);
  expect(lanes[0]!.spots[0]!.rfUncertainty).toBeCloseTo(0.0123, 4);
});

it('flags marks in photo pixels as not corrected for perspective', () => {
  const { flags } = measureMarks({ ...marks, units: 'px' });
  expect(flags).toEqual(['perspective not corrected', 'scale not known']);
});

it('names the spot, the lane or the line that is wrong, each once', () => {
  const beyond = measureMarks({ ...marks, lanes: [{ spots: [{ x: 10, y: 30 }] }] });
  expect(beyond.problems).toEqual([
    { path: 'lanes.0.spots.0', message: 'The spot lies beyond the solvent front: mark it again.' },
  ]);
  const off = measureMarks({ ...marks, lanes: [{ x: 70, spots: [] }] });
  expect(off.problems.map((one) => one.path)).toEqual(['lanes.0.x']);
  const swapped = measureMarks({
    ...marks,
    units: 'px',
    baseline: marks.front,
    front: marks.baseline,
    lanes: [
      {
        spots: [
          { x: 1, y: 68 },
          { x: 1, y: 60 },
        ],
      },
    ],
  });
  expect(swapped.problems.map((one) => one.path)).toEqual(['front']);
});

it('checks the lines also where a lane shows no spot', () => {
  const { problems } = measureMarks({
    ...marks,
    units: 'px',
    front: [{ x: 0, y: 95 }],
    lanes: [{ x: 5, spots: [] }],
  });
  expect(problems.map((one) => one.path)).toEqual(['front']);
});
