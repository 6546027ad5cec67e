import { expect, it } from 'vitest';
import { literatureConditionsText, literatureValueText } from './literature-text';
import type { LiteratureValueJson } from './schema';

const none = {
  temperatureC: null,
  pressureKPa: null,
  wavelengthNm: null,
  rangeMinC: null,
  rangeMaxC: null,
};
const row = (fields: Partial<LiteratureValueJson>) =>
  ({
    value: null,
    coefficients: null,
    unit: '1',
    property: '',
    uncertainty: null,
    conditions: none,
    ...fields,
  }) as LiteratureValueJson;

it('shows an index with four places, and every other number as it was entered', () => {
  expect(literatureValueText(row({ property: 'refractive index', value: 1.472 }))).toBe('1.4720');
  expect(literatureValueText(row({ property: 'refractive index', value: 1.47245 }))).toBe('1.47245');
  expect(literatureValueText(row({ property: 'flash point', value: -20, unit: '°C' }))).toBe(
    '\u221220\u00a0°C',
  );
});

it('names the coefficients', () => {
  expect(
    literatureValueText(row({ coefficients: { A: 6.1, criticalPressureKPa: 4126 }, unit: 'kPa, K' })),
  ).toBe('A\u00a06.1, Pc (kPa)\u00a04126 (kPa, K)');
});

it('says the conditions that are known and no others', () => {
  const conditions = { ...none, temperatureC: 20, wavelengthNm: 589.3 };
  expect(literatureConditionsText(row({ conditions, uncertainty: 0.0002 }))).toBe(
    'at 20\u00a0°C, 589.3\u00a0nm, ± 0.0002',
  );
  expect(literatureConditionsText(row({}))).toBe('');
});
