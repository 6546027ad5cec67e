import type { RefractiveReading } from '@/models';
import { type RefractiveReadingJson, refractiveResultSchema } from './schema';

/** A stored reading as JSON, with what was made of it when it was entered. */
export function presentRefractiveReading(
  reading: RefractiveReading,
  fractionCode: string,
): RefractiveReadingJson {
  return {
    id: reading.id,
    fraction: fractionCode,
    readings: reading.readings,
    temperatureC: reading.temperatureC,
    wavelengthNm: reading.wavelengthNm,
    waterReading: reading.waterReading ?? null,
    waterTemperatureC: reading.waterTemperatureC ?? null,
    instrument: reading.instrument ?? null,
    state: reading.state,
    methodVersion: reading.methodVersion,
    readBy: reading.readByName,
    createdAt: reading.createdAt.toISOString(),
    ...refractiveResultSchema.parse(reading.result),
  };
}
