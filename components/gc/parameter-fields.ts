import { z } from 'zod';
import { integrationParametersSchema, type IntegrationParameters } from '@/lib/evidence/gc/parameters';

/** One field of the form, read off the schema that the server checks with. */
export type ParameterField = {
  key: keyof IntegrationParameters;
  kind: 'number' | 'choice' | 'switch';
  hint: string;
  choices: string[];
};

type Drawn = {
  type?: string;
  enum?: string[];
  description?: string;
  minimum?: number;
  maximum?: number;
};

/** Words and units; a parameter that is new in the schema is shown under its own name until it has some. */
export const parameterWords: Partial<Record<string, { label: string; unit?: string }>> = {
  minimumSignalToNoise: { label: 'Smallest S/N' },
  minimumAreaPercent: { label: 'Smallest area', unit: '%' },
  baseline: { label: 'Baseline' },
  skimHeightRatio: { label: 'Skim peaks lower by a factor of' },
  reportShoulders: { label: 'Report shoulders' },
};

/** The plain parameters of an integration as form fields, with the limits that the schema sets. */
export function parameterFields(): ParameterField[] {
  const schema = z.toJSONSchema(integrationParametersSchema, { io: 'input' });
  return Object.entries(schema.properties ?? {}).flatMap(([key, value]): ParameterField[] => {
    const drawn = value as Drawn;
    const field = { key: key as ParameterField['key'], choices: drawn.enum ?? [] };
    if (drawn.enum) return [{ ...field, kind: 'choice', hint: drawn.description ?? '' }];
    if (drawn.type === 'boolean') return [{ ...field, kind: 'switch', hint: drawn.description ?? '' }];
    if (drawn.type !== 'number') return [];
    const limits = `${drawn.minimum} to ${drawn.maximum}`;
    return [{ ...field, kind: 'number', hint: [drawn.description, limits].filter(Boolean).join('; ') }];
  });
}

/** What the form holds: texts as typed. */
export type ParameterTexts = {
  plain: Record<string, string | boolean>;
  smoothing: boolean;
  windowPoints: string;
  order: '2' | '4';
  exclude: { fromMin: string; toMin: string; reason: string }[];
};

export function textsOf(parameters: IntegrationParameters): ParameterTexts {
  const plain: ParameterTexts['plain'] = {};
  for (const { key, kind } of parameterFields()) {
    const value = parameters[key];
    plain[key] = kind === 'switch' ? Boolean(value) : String(value);
  }
  return {
    plain,
    smoothing: parameters.smoothing !== null,
    windowPoints: String(parameters.smoothing?.windowPoints ?? 7),
    order: parameters.smoothing?.order === 4 ? '4' : '2',
    exclude: parameters.exclude.map(({ fromMin, toMin, reason }) => ({
      fromMin: String(fromMin),
      toMin: String(toMin),
      reason,
    })),
  };
}

const numberOf = (text: string) => (text.trim() === '' ? Number.NaN : Number(text.trim().replace(',', '.')));

/** Reads the texts by the schema: the parameters, or what is wrong by field. */
export function readTexts(
  texts: ParameterTexts,
): { ok: true; parameters: IntegrationParameters } | { ok: false; problems: Record<string, string> } {
  const plain = Object.fromEntries(
    parameterFields().map(({ key, kind }) => [
      key,
      kind === 'number' ? numberOf(String(texts.plain[key])) : texts.plain[key],
    ]),
  );
  const parsed = integrationParametersSchema.safeParse({
    ...plain,
    smoothing: texts.smoothing
      ? { method: 'savitzky-golay', windowPoints: numberOf(texts.windowPoints), order: Number(texts.order) }
      : null,
    exclude: texts.exclude.map(({ fromMin, toMin, reason }) => ({
      fromMin: numberOf(fromMin),
      toMin: numberOf(toMin),
      reason,
    })),
  });
  if (parsed.success) return { ok: true, parameters: parsed.data };
  const problems = parsed.error.issues.map(({ path, message, code }) => [
    path.join('.'),
    code === 'invalid_type' ? 'Enter a number.' : message,
  ]);
  return { ok: false, problems: Object.fromEntries(problems) };
}
