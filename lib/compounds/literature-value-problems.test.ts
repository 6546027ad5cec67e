import { describe, expect, it } from 'vitest';
import { literatureValueProblems } from './literature-value-problems';
import { isLiteratureProperty, LITERATURE_PROPERTY_NAMES, propertyDefinition } from './property-names';

describe('literature values before they are stored', () => {
  it('accepts a refractive index with its temperature and wavelength', () => {
    expect(
      literatureValueProblems({
        property: 'refractive index',
        value: 1.3723,
        temperatureC: 20,
        wavelengthNm: 589.3,
      }),
    ).toEqual([]);
  });

  it('asks for the temperature that a refractive index needs', () => {
    const problems = literatureValueProblems({
      property: 'refractive index',
      value: 1.3723,
      wavelengthNm: 589.3,
    });
    expect(problems).toHaveLength(1);
    expect(problems[0]).toContain('temperature in °C');
  });

  it('finds an index typed without its point', () => {
    const [problem] = literatureValueProblems({
      property: 'refractive index',
      value: 13723,
      temperatureC: 20,
      wavelengthNm: 589.3,
    });
    expect(problem).toContain('not plausible');
  });

  it('accepts a density whose temperature is lost, since older tables lost it', () => {
    expect(literatureValueProblems({ property: 'density', value: 0.9003 })).toEqual([]);
    expect(propertyDefinition('density').wants).toContain('temperatureC');
  });

  it('asks for each missing coefficient and for the range of an Antoine equation', () => {
    const problems = literatureValueProblems({
      property: 'Antoine coefficients',
      coefficients: { A: 6, B: 1200, X: 1 },
    });
    expect(problems.join(' ')).toContain('coefficient C');
    expect(problems.join(' ')).toContain('Remove the coefficient X');
    expect(problems.join(' ')).toContain('lower end');
    expect(problems.join(' ')).toContain('upper end');
  });

  it('refuses a range that is upside down', () => {
    const problems = literatureValueProblems({
      property: 'Antoine coefficients',
      coefficients: { A: 6, B: 1200, C: 220 },
      rangeMinC: 90,
      rangeMaxC: 10,
    });
    expect(problems).toEqual(['The lower end of the temperature range must lie below the upper end.']);
  });

  it('treats a missing number and a value that is no number as missing', () => {
    expect(literatureValueProblems({ property: 'flash point' })).toHaveLength(1);
    expect(literatureValueProblems({ property: 'flash point', value: Number.NaN })).toHaveLength(1);
    expect(literatureValueProblems({ property: 'flash point', value: 0 })).toEqual([]);
  });

  it('keeps the list of properties closed', () => {
    expect(LITERATURE_PROPERTY_NAMES).toHaveLength(10);
    expect(isLiteratureProperty('density')).toBe(true);
    expect(isLiteratureProperty('colour')).toBe(false);
    expect(isLiteratureProperty('toString')).toBe(false);
  });
});
