import { describe, expect, it } from 'vitest';
import { FormReader, pressureText } from './read-form';

describe('reading a form', () => {
  it('takes an empty field for nothing and a comma for a decimal sign', () => {
    const read = new FormReader();
    expect(read.massG('tareMassG', ' ')).toBeNull();
    expect(read.massG('grossMassG', '92,62')).toBe(92.62);
    expect(read.temperatureC('headTemperatureFromC', '-3,5 °C')).toBe(-3.5);
    expect(read.number('columnStages', '12')).toBe(12);
    expect(read.fine).toBe(true);
  });

  it('reads a pressure in the chosen unit unless one is typed', () => {
    const read = new FormReader();
    // 1 mmHg = 1.33322 mbar (NIST SP 811, appendix B).
    expect(read.pressureMbar('pressureMbar', '10', 'mmHg')).toBeCloseTo(13.3322, 3);
    expect(read.pressureMbar('pressureMbar', '10 kPa', 'mmHg')).toBeCloseTo(100, 9);
  });

  it('keeps a problem by the name of the field, the first one first', () => {
    const read = new FormReader();
    read.massG('chargeMassG', 'heavy');
    read.require('chargeMassG', false, 'Enter the charge.');
    read.require('technique', false, 'Choose one.');
    expect(Object.keys(read.problems)).toEqual(['chargeMassG', 'technique']);
    expect(read.problems.chargeMassG).toContain('heavy');
    expect(read.fine).toBe(false);
  });

  it('writes a kept pressure in the chosen unit', () => {
    expect(pressureText(100, 'kPa')).toBe('10.0');
    expect(pressureText(null, 'kPa')).toBe('');
  });
});
