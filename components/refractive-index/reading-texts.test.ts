import { describe, expect, it } from 'vitest';
import { emptyReadingTexts, readReadingTexts } from './reading-texts';

const typed = { ...emptyReadingTexts, readings: ['1,3721', '', '1.3722'], temperatureC: '21,5' };

describe('the form of refractometer readings', () => {
  it('reads points and commas, and leaves empty fields out', () => {
    expect(readReadingTexts(typed)).toEqual({
      body: {
        readings: [1.3721, 1.3722],
        temperatureC: 21.5,
        wavelengthNm: 589.3,
        waterReading: undefined,
        waterTemperatureC: undefined,
        instrument: undefined,
      },
      problems: {},
    });
  });

  it('names a slip by the field it stands in', () => {
    const { body, problems } = readReadingTexts({ ...typed, readings: ['', '', '13722'] });
    expect(body).toBeNull();
    expect(Object.keys(problems)).toEqual(['readings.2']);
  });

  it('asks for what is missing', () => {
    const { problems } = readReadingTexts({
      ...emptyReadingTexts,
      waterTemperatureC: '20',
      temperatureC: 'warm',
    });
    expect(problems.readings).toMatch(/at least one/);
    expect(problems.temperatureC).toMatch(/number/);
  });
});
