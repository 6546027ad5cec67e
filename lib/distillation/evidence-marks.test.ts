import { describe, expect, it } from 'vitest';
import { criterionKinds } from '@/lib/acceptance/criteria/registry';
import { evidenceMarks } from './evidence-marks';

const none = { tlc: 'missing', gc: 'missing', refractiveIndex: 'missing', boilingRange: 'missing' };

describe('the marks under a cut', () => {
  it('are all missing without a verdict', () => {
    expect(evidenceMarks(null)).toEqual(none);
    expect(evidenceMarks({ results: [{ name: 'GC', state: 'splendid' }] })).toEqual(none);
  });

  it('take the heaviest of several criteria of one kind', () => {
    const results = [
      { name: 'GC area % of the target', state: 'pass' },
      { name: 'GC, largest single impurity', state: 'inconclusive' },
      { name: 'TLC clean, UV 254 nm', state: 'pass' },
      { name: 'TLC clean, iodine', state: 'missing' },
      { name: 'Refractive index', state: 'fail' },
    ];
    expect(evidenceMarks({ results })).toEqual({
      tlc: 'missing',
      gc: 'inconclusive',
      refractiveIndex: 'fail',
      boilingRange: 'missing',
    });
  });

  it('know every criterion that a specification can hold, but water, which has no mark of its own', () => {
    const unknown = Object.values(criterionKinds)
      .map((kind) => kind.name)
      .filter(
        (name) =>
          Object.values(evidenceMarks({ results: [{ name, state: 'pass' }] })).join() ===
          Object.values(none).join(),
      );
    expect(unknown).toEqual(['Water']);
  });
});
