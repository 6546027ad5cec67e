import { describe, expect, it } from 'vitest';
import { criteriaSchema } from '@/lib/acceptance/criteria/registry';
import { noLimits, readLimits } from './read-limits';

describe('what is typed as a specification', () => {
  it('becomes limits that the server takes, with comma or point', () => {
    const { criteria, errors } = readLimits({
      ...noLimits,
      gcAreaPercentMin: '99,5',
      boilingToleranceC: '1.5',
      tlcCleanUnder: ['uv-254'],
    });
    expect(errors).toEqual({});
    expect(criteria).toEqual({
      gcAreaPercentMin: 99.5,
      boilingRange: { toleranceC: 1.5 },
      tlcCleanUnder: ['uv-254'],
    });
    expect(criteriaSchema.safeParse(criteria).success).toBe(true);
  });
  it('names what is no number, and a width without a distance', () => {
    expect(readLimits({ ...noLimits, waterMaxPercent: 'little' }).errors).toHaveProperty('waterMaxPercent');
    expect(readLimits({ ...noLimits, boilingMaximumWidthC: '2' }).errors).toHaveProperty('boilingToleranceC');
  });
});
