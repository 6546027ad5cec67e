import type { z } from 'zod';
import { newRefractiveReadingSchema } from '@/lib/evidence/refractive-index/schema';

/** The form as typed. */
export const emptyReadingTexts = {
  readings: ['', '', ''],
  temperatureC: '',
  wavelengthNm: '589.3',
  waterReading: '',
  waterTemperatureC: '',
  instrument: '',
};
export type ReadingTexts = typeof emptyReadingTexts;

/** NaN for what is no number, so that the schema names the field; undefined for an empty field. */
function numberOf(text: string): number | undefined {
  if (text.trim() === '') return undefined;
  return /^[+\-\u2212]?\d+([.,]\d*)?$/.test(text.trim())
    ? Number(text.trim().replace(',', '.').replace('\u2212', '-'))
    : Number.NaN;
}

/** Reads the form by the schema of the API: a body to send, or what is wrong by the field's place in the form. */
export function readReadingTexts(texts: ReadingTexts): {
  body: z.input<typeof newRefractiveReadingSchema> | null;
  problems: Record<string, string>;
} {
  const filled = texts.readings.flatMap((text, at) =>
    text.trim() === '' ? [] : [{ at, value: numberOf(text)! }],
  );
  const body = {
    readings: filled.map(({ value }) => value),
    temperatureC: numberOf(texts.temperatureC) as number,
    wavelengthNm: numberOf(texts.wavelengthNm),
    waterReading: numberOf(texts.waterReading),
    waterTemperatureC: numberOf(texts.waterTemperatureC),
    instrument: texts.instrument.trim() || undefined,
  };
  const parsed = newRefractiveReadingSchema.safeParse(body);
  if (parsed.success) return { body, problems: {} };
  const problems: Record<string, string> = {};
  for (const { path, message, code } of parsed.error.issues) {
    // A reading is named by its field, since empty ones between are left out.
    const name =
      path[0] === 'readings' && typeof path[1] === 'number'
        ? `readings.${filled[path[1]]?.at ?? 0}`
        : path.join('.');
    const example = /temperature/i.test(name) ? '20.0' : name === 'wavelengthNm' ? '589.3' : '1.3723';
    problems[name] ??= code === 'invalid_type' ? `Enter a number, for example ${example}.` : message;
  }
  return { body: null, problems };
}
