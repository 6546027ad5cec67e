import { describe, expect, it } from 'vitest';
import { readIndices, readRefractive } from './read-refractive';

const texts = {
  readings: '1,3721 1.3722',
  temperatureC: '27,3',
  waterReading: '',
  waterTemperatureC: '',
  instrument: '',
};

describe('refractometer readings as they are typed', () => {
  it('are read with comma or point, parted by spaces, semicolons or line ends', () => {
    expect(readIndices('1,3721; 1.3722\n1.3720')).toEqual([1.3721, 1.3722, 1.372]);
    expect(readRefractive(texts)).toEqual({
      body: { readings: [1.3721, 1.3722], temperatureC: 27.3 },
      problem: null,
    });
  });
  it('are refused without a temperature, without a reading, or with a word among them', () => {
    expect(readRefractive({ ...texts, temperatureC: '' }).problem).toContain('temperature');
    expect(readRefractive({ ...texts, readings: ' ' }).problem).toContain('readings');
    expect(readRefractive({ ...texts, readings: '1.3721 about' }).problem).toContain('no number');
  });
});
