import { describe, expect, it } from 'vitest';
import { bare, ethylAcetate, gcTrace } from './compound-facts.fixture';
import type { Criteria } from './criteria/registry';
import { nextStepOf } from './next-step';
import { judge } from './verdict';

/** What is next for an open fraction with one other peak of the given area %. */
function nextWith(areaPercent: number, criteria: Criteria) {
  const specification = { id: 's', grade: 'g', edition: 1, decisionRule: 'guarded' as const, criteria };
  const judged = judge({
    ...bare(ethylAcetate),
    traces: [gcTrace(ethylAcetate, { areaPercent })],
    specification,
  });
  return nextStepOf({
    status: 'open',
    transitions: [],
    verdict: { ...judged, judgedAt: null, specification },
  });
}

describe('what is next for an open fraction', () => {
  it('is to submit it where it passes', () => {
    expect(nextWith(0.2, { gcAreaPercentMin: 99 })).toBe('The chemist submits it for sign-off.');
  });
  it('is not to submit it where it fails: the limit is named, with what can be done', () => {
    const next = nextWith(5, { gcAreaPercentMin: 99 });
    expect(next).toContain('GC area % of the target');
    expect(next).toMatch(/measures again if in doubt, distils it again, or keeps it out of use/);
    expect(next).not.toContain('submit');
  });
  it('says so even while other evidence is missing: more evidence heals no fail', () => {
    expect(nextWith(5, { gcAreaPercentMin: 99, tlcCleanUnder: ['uv-254'] })).not.toContain(
      'adds what is missing',
    );
  });
  it('is to add what is missing where nothing fails', () => {
    expect(nextWith(0.2, { gcAreaPercentMin: 99, tlcCleanUnder: ['uv-254'] })).toContain(
      'adds what is missing',
    );
  });
});
