import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convertMass, formatMass, parseMassG } from './mass';
import { convertPressure, formatPressure, parsePressureMbar, type PressureUnit } from './pressure';
import { formatTemperature, parseTemperatureC, temperatureFromC, temperatureToC } from './temperature';

describe('text that is not a quantity', () => {
  it.each(['', '   ', 'hot', '--5', '1.234,5', '1,234.5', '1.2.3', '5 5 kPa', 'NaN', 'Infinity', '1e999'])(
    'refuses %j as a pressure and says how to write it',
    (text) => {
      const parsed = parsePressureMbar(text);
      expect(parsed.ok).toBe(false);
      if (!parsed.ok) expect(parsed.problem.length).toBeGreaterThan(15);
    },
  );

  it('refuses a unit of another quantity', () => {
    expect(parsePressureMbar('5 g').ok).toBe(false);
    expect(parseMassG('5 mbar').ok).toBe(false);
    expect(parseTemperatureC('5 toString').ok).toBe(false);
  });

  it('refuses a temperature below absolute zero, a pressure of zero and a negative mass', () => {
    expect(parseTemperatureC('-280').ok).toBe(false);
    expect(parseTemperatureC('-1 K').ok).toBe(false);
    expect(parsePressureMbar('0').ok).toBe(false);
    expect(parsePressureMbar('-20 mbar').ok).toBe(false);
    expect(parseMassG('-0.5').ok).toBe(false);
  });
});

describe('pressure', () => {
  // NIST SP 811, appendix B: 1 mmHg = 133.3224 Pa, 1 Torr = 101325/760 Pa.
  it.each([
    ['50 mmHg', 66.6612],
    ['5 kPa', 50],
    ['23,5', 23.5],
    ['760 Torr', 1013.25],
    ['1 atm', 1013.25],
    ['.5 bar', 500],
    ['100\u00a0hPa', 100],
    ['1e2 Pa', 1],
  ])('reads %s', (text, mbar) => {
    const parsed = parsePressureMbar(text);
    expect(parsed.ok && parsed.value).toBeCloseTo(mbar, 3);
  });

  it('uses the unit the person has chosen when none is written', () => {
    const parsed = parsePressureMbar('50', 'mmHg');
    expect(parsed.ok && parsed.value).toBeCloseTo(66.661, 3);
  });

  it('shows three significant figures with the unit', () => {
    expect(formatPressure(66.6612)).toBe('66.7 mbar');
    expect(formatPressure(66.6612, 'mmHg')).toBe('50.0 mmHg');
    expect(formatPressure(1013.25, 'kPa')).toBe('101 kPa');
    expect(formatPressure(0.0123)).toBe('0.0123 mbar');
  });

  it('throws for numbers that are no pressure', () => {
    for (const bad of [Number.NaN, 0, -1, Number.POSITIVE_INFINITY]) {
      expect(() => convertPressure(bad, 'mbar', 'kPa')).toThrow(RangeError);
    }
  });

  it('comes back to the same value through any other unit', () => {
    const unit = fc.constantFrom<PressureUnit>('mbar', 'mmHg', 'Torr', 'kPa', 'hPa', 'Pa', 'bar', 'atm');
    fc.assert(
      fc.property(fc.double({ min: 1e-4, max: 1e6, noNaN: true }), unit, unit, (value, from, to) => {
        const back = convertPressure(convertPressure(value, from, to), to, from);
        expect(Math.abs(back / value - 1)).toBeLessThan(1e-12);
      }),
    );
  });
});

describe('temperature', () => {
  it.each([
    ['23,5', 23.5],
    ['23.5 °C', 23.5],
    ['\u22125 C', -5],
    ['273.15 K', 0],
    ['212 °F', 100],
  ])('reads %s', (text, celsius) => {
    const parsed = parseTemperatureC(text);
    expect(parsed.ok && parsed.value).toBeCloseTo(celsius, 9);
  });

  it('writes a true minus sign and never a negative zero', () => {
    expect(formatTemperature(-5.25)).toBe('\u22125.3 °C');
    expect(formatTemperature(-0.01)).toBe('0.0 °C');
    expect(formatTemperature(25, 'K', 2)).toBe('298.15 K');
  });

  it('comes back to the same value through kelvin and Fahrenheit', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -273, max: 1000, noNaN: true }),
        fc.constantFrom('K', '°F' as const),
        (t, unit) => {
          const u = unit as 'K' | '°F';
          expect(temperatureToC(temperatureFromC(t, u), u)).toBeCloseTo(t, 9);
        },
      ),
    );
  });

  it('throws below absolute zero', () => {
    expect(() => temperatureFromC(-300, 'K')).toThrow(/absolute zero/);
    expect(() => temperatureToC(Number.NaN, '°C')).toThrow(RangeError);
  });
});

describe('mass', () => {
  it('reads grams, milligrams and kilograms', () => {
    expect(parseMassG('23,512')).toEqual({ ok: true, value: 23.512, unit: 'g' });
    expect(parseMassG('250 mg')).toEqual({ ok: true, value: 0.25, unit: 'g' });
    expect(parseMassG('1.2 kg')).toEqual({ ok: true, value: 1200, unit: 'g' });
  });

  it('formats with two decimals and keeps the sign of a difference', () => {
    expect(formatMass(23.512)).toBe('23.51 g');
    expect(formatMass(-1.5)).toBe('\u22121.50 g');
    expect(convertMass(-2, 'kg', 'g')).toBe(-2000);
  });
});
