import { describe, expect, it } from 'vitest';
import { headCurve } from './head-curve';

const minute = (m: number) => new Date(Date.UTC(2026, 9, 5, 8, m));
const at = (m: number, headTemperatureC: number, volumeMl: number | null = null) => ({
  at: minute(m),
  headTemperatureC,
  volumeMl,
});

describe('the head temperature over what was collected', () => {
  const fractions = [
    { cut: 'fore-run', collectedAt: minute(10), netMassG: 10 },
    { cut: 'heart', collectedAt: minute(20), netMassG: 40 },
    { cut: 'residue', collectedAt: minute(60), netMassG: 30 },
  ];

  it('uses the volumes where they were logged', () => {
    expect(headCurve([at(1, 60, 0), at(2, 70, 12), at(3, 71)], fractions, null)).toEqual([
      { headTemperatureC: 60, volumeMl: 0 },
      { headTemperatureC: 70, volumeMl: 12 },
    ]);
  });

  it('otherwise fills each receiver evenly until the next one is put on, and the last until the end', () => {
    const readings = [at(5, 40), at(15, 60), at(20, 70), at(40, 77), at(60, 78)];
    expect(headCurve(readings, fractions, minute(60)).map((point) => point.collectedMassG)).toEqual([
      0, 5, 10, 30, 50,
    ]);
  });

  it('takes the last reading for the end of a run that still goes on', () => {
    expect(headCurve([at(20, 70), at(40, 77)], fractions, null).map((p) => p.collectedMassG)).toEqual([
      10, 50,
    ]);
  });

  it('puts everything at zero before a receiver is there', () => {
    expect(headCurve([at(1, 20)], [], null)).toEqual([{ headTemperatureC: 20, collectedMassG: 0 }]);
  });
});
