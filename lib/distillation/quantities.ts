import { z } from 'zod';

/** The bounds of what is measured at a still. Outside them a value is taken for a slip of the finger. */
export const headTemperatureC = z
  .number()
  .min(-100, 'A head temperature lies between -100 and 500 °C: check sign and unit.')
  .max(500, 'A head temperature lies between -100 and 500 °C: check sign and unit.');
export const bathTemperatureC = z
  .number()
  .min(-100, 'A bath temperature lies between -100 and 600 °C: check sign and unit.')
  .max(600, 'A bath temperature lies between -100 and 600 °C: check sign and unit.');
export const pressureMbar = z
  .number()
  .positive('Give the absolute pressure: it is above zero.')
  .max(1999, 'Glass stills are not run above 1999 mbar absolute: check the unit.');
export const massG = z
  .number()
  .min(0, 'A mass is not negative: check that the balance was tared.')
  .max(1_000_000, 'That is over a tonne: give the mass in g.');
export const volumeMl = z
  .number()
  .min(0, 'A volume is not negative.')
  .max(1_000_000, 'That is over a cubic metre: give the volume in mL.');
/** ISO 8601 with an offset or Z. */
export const instant = z.iso.datetime({
  offset: true,
  error: 'Give the time as ISO 8601 with its offset, for example 2026-11-02T09:30:00Z.',
});
export const shortText = (max: number) => z.string().trim().min(1, 'Fill this in or leave it out.').max(max);

/** `{id, name, cas}`: how a compound is named inside other records. */
export const compoundRefSchema = z.object({ id: z.string(), name: z.string(), cas: z.string().nullable() });
export type CompoundRef = z.infer<typeof compoundRefSchema>;
export const nameRefSchema = z.object({ id: z.string(), name: z.string() });
/** Codes as they stand in addresses; whether one exists is for the database to say. */
export const codeParams = z.object({ code: z.string().min(1).max(30) });
