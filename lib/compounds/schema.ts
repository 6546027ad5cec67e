import { z } from 'zod';
import { pageQuery } from '@/lib/http/paging';
import { PEROXIDE_CLASSES } from './hazards';
import { LITERATURE_PROPERTY_NAMES } from './property-names';

const name = z.string().trim().min(1, 'Enter a name.').max(200, 'A name may have up to 200 signs.');
const emptyIsNull = (text: string) => (text === '' ? null : text);
const optionalText = (max: number) => z.string().trim().max(max).transform(emptyIsNull).nullish();

/** As IUPAC writes an InChIKey: 14 letters, 10 letters, one letter. */
export const INCHI_KEY = /^[A-Z]{14}-[A-Z]{10}-[A-Z]$/;

const changeable = {
  name,
  synonyms: z.array(name).max(50, 'A compound may have up to 50 synonyms.').optional(),
  cas: optionalText(40).describe('CAS number; its check digit is verified'),
  formula: optionalText(80).describe('molecular formula; computed where a SMILES is given'),
  molarMassGMol: z.number().positive('A molar mass is above 0 g/mol.').max(20_000).nullish(),
  smiles: optionalText(500),
  inchiKey: z
    .string()
    .trim()
    .toUpperCase()
    .regex(INCHI_KEY, 'An InChIKey has the form XEKOWRVHYACXOJ-UHFFFAOYSA-N.')
    .nullish(),
  peroxideClass: z.enum(PEROXIDE_CLASSES).nullish(),
};

/** Body of POST /api/v1/compounds. */
export const newCompoundSchema = z.strictObject(changeable);
export type NewCompound = z.infer<typeof newCompoundSchema>;

/** Body of PATCH /api/v1/compounds/{id}: what is left out stays, null empties a field, `synonyms` replaces them all. */
export const compoundChangeSchema = newCompoundSchema
  .partial()
  .refine((change) => Object.keys(change).length > 0, 'Send at least one field to change.');
export type CompoundChange = z.infer<typeof compoundChangeSchema>;

export const compoundParams = z.object({ id: z.uuid() });

export const compoundListQuery = z.strictObject({
  ...pageQuery,
  q: z
    .string()
    .trim()
    .max(200)
    .optional()
    .describe('name, synonym, CAS number, InChIKey or formula; what begins with it comes first'),
});
export type CompoundListQuery = z.infer<typeof compoundListQuery>;

const boilingPointSchema = z.object({ value: z.number(), pressureKPa: z.number(), source: z.string() });

/** A compound in a list. */
export const compoundRowSchema = z.object({
  id: z.string(),
  version: z.number(),
  name: z.string(),
  synonyms: z.array(z.string()),
  cas: z.string().nullable(),
  formula: z.string().nullable(),
  molarMassGMol: z.number().nullable(),
  smiles: z.string().nullable(),
  inchiKey: z.string().nullable(),
  peroxideClass: z.enum(PEROXIDE_CLASSES).nullable(),
  normalBoilingPointC: boilingPointSchema.nullable(),
});
export type CompoundRow = z.infer<typeof compoundRowSchema>;
export const compoundPageSchema = z.object({
  items: z.array(compoundRowSchema),
  nextCursor: z.string().nullable(),
});

/** A compound alone, with what follows from its records. */
export const compoundSchema = compoundRowSchema.extend({
  structure: z.string().nullable().describe('address of the drawing, SVG'),
  hazards: z.object({
    peroxide: z
      .object({
        peroxideClass: z.enum(PEROXIDE_CLASSES),
        word: z.string(),
        advice: z.string(),
        source: z.string(),
      })
      .nullable(),
    flashPointC: z.object({ value: z.number(), source: z.string() }).nullable(),
    autoignitionTemperatureC: z.object({ value: z.number(), source: z.string() }).nullable(),
  }),
  plate: z.object({
    evaporates: z
      .boolean()
      .nullable()
      .describe('may leave a plate before it is seen; null: no boiling point'),
    visualisers: z.array(
      z.object({
        id: z.string(),
        name: z.string(),
        state: z.enum(['sees', 'blind', 'uncertain']),
        reason: z.string(),
      }),
    ),
  }),
  createdAt: z.string(),
  updatedAt: z.string(),
});
export type CompoundJson = z.infer<typeof compoundSchema>;

const property = z.enum(LITERATURE_PROPERTY_NAMES);
const temperatureC = z.number().min(-273.15, 'That is below absolute zero.').max(2000);

/** Body of POST /api/v1/compounds/{id}/literature. `corrects` names the value that this one replaces. */
export const newLiteratureValueSchema = z
  .strictObject({
    property,
    value: z.number().nullish(),
    coefficients: z.record(z.string().max(40), z.number()).nullish(),
    unit: z.string().max(30).optional().describe('the unit of the property; refused where it is another one'),
    temperatureC: temperatureC.nullish(),
    pressureKPa: z.number().positive('A pressure is above 0 kPa.').max(1e6).nullish(),
    wavelengthNm: z.number().min(100).max(5000).nullish(),
    rangeMinC: temperatureC.nullish(),
    rangeMaxC: temperatureC.nullish(),
    uncertainty: z.number().positive('An uncertainty is above 0.').nullish(),
    source: z
      .string()
      .trim()
      .min(3, 'Name the publication: a value without a source cannot be judged.')
      .max(400),
    note: optionalText(400),
    preferred: z.boolean().optional(),
    corrects: z.uuid().optional(),
    reason: z.string().trim().min(1).max(1000).optional(),
  })
  .refine((draft) => draft.corrects === undefined || draft.reason !== undefined, {
    path: ['reason'],
    error: 'Say why the value is corrected.',
  });
export type NewLiteratureValue = z.infer<typeof newLiteratureValueSchema>;

/** Body of PATCH /api/v1/compounds/{id}/literature/{valueId}. */
export const preferLiteratureValueSchema = z.strictObject({
  preferred: z.literal(true),
  reason: z.string().trim().min(1, 'Say why this value is preferred.').max(1000),
});

export const literatureValueParams = z.object({ id: z.uuid(), valueId: z.uuid() });

export const literatureListQuery = z.strictObject({
  ...pageQuery,
  property: property.optional(),
  inForce: z.enum(['true', 'false']).optional().describe('true: only what no correction has replaced'),
});
export type LiteratureListQuery = z.infer<typeof literatureListQuery>;

export const literatureValueSchema = z.object({
  id: z.string(),
  version: z.number(),
  property: z.string(),
  value: z.number().nullable(),
  coefficients: z.record(z.string(), z.number()).nullable(),
  unit: z.string(),
  conditions: z.object({
    temperatureC: z.number().nullable(),
    pressureKPa: z.number().nullable(),
    wavelengthNm: z.number().nullable(),
    rangeMinC: z.number().nullable(),
    rangeMaxC: z.number().nullable(),
  }),
  uncertainty: z.number().nullable(),
  source: z.string(),
  note: z.string().nullable(),
  preferred: z.boolean(),
  corrects: z.string().nullable(),
  replacedAt: z.string().nullable(),
  reason: z.string().nullable(),
  addedBy: z.string().nullable().describe('null: from the reference table'),
  createdAt: z.string(),
});
export type LiteratureValueJson = z.infer<typeof literatureValueSchema>;
export const literaturePageSchema = z.object({
  items: z.array(literatureValueSchema),
  nextCursor: z.string().nullable(),
});
