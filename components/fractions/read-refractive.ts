export type RefractiveTexts = {
  readings: string;
  temperatureC: string;
  waterReading: string;
  waterTemperatureC: string;
  instrument: string;
};

/** Numbers as people type them: parted by spaces, semicolons or line ends, with decimal comma or point. */
export function readIndices(text: string): number[] {
  return text
    .split(/[\s;]+/)
    .filter(Boolean)
    .map((one) => Number(one.replace(',', '.')));
}

function optional(text: string): number | undefined {
  return text.trim() === '' ? undefined : Number(text.trim().replace(',', '.'));
}

/** The body for the API; what is no number stays NaN and is named by `problem`. */
export function readRefractive(texts: RefractiveTexts): {
  body: Record<string, unknown>;
  problem: string | null;
} {
  const readings = readIndices(texts.readings);
  const temperatureC = optional(texts.temperatureC);
  const waterReading = optional(texts.waterReading);
  const waterTemperatureC = optional(texts.waterTemperatureC);
  const numbers = [...readings, temperatureC, waterReading, waterTemperatureC];
  const problem =
    readings.length === 0
      ? 'Enter the readings, such as 1.3721 1.3722 1.3721.'
      : temperatureC === undefined
        ? 'Enter the temperature of the prism: without it the index cannot be compared.'
        : numbers.some((number) => Number.isNaN(number))
          ? 'One of these is no number. Use a point or comma for decimals and a space between readings.'
          : null;
  return {
    body: {
      readings,
      temperatureC,
      ...(waterReading === undefined ? {} : { waterReading }),
      ...(waterTemperatureC === undefined ? {} : { waterTemperatureC }),
      ...(texts.instrument.trim() ? { instrument: texts.instrument.trim() } : {}),
    },
    problem,
  };
}
