import { describe, expect, it } from 'vitest';
import { defaultIntegrationParameters, integrationParametersSchema } from '@/lib/evidence/gc/parameters';
import { parameterFields, parameterWords, readTexts, textsOf } from './parameter-fields';

describe('the form of integration parameters', () => {
  it('has a field for every parameter of the schema, each with words', () => {
    const drawn = parameterFields().map(({ key }) => key as string);
    expect(new Set([...drawn, 'smoothing', 'exclude'])).toEqual(
      new Set(Object.keys(integrationParametersSchema.shape)),
    );
    expect(drawn.filter((key) => !parameterWords[key])).toEqual([]);
  });

  it('gives back what it was filled with', () => {
    const parameters = integrationParametersSchema.parse({
      minimumSignalToNoise: 5,
      smoothing: { method: 'savitzky-golay', windowPoints: 9, order: 4 },
      exclude: [{ fromMin: 1, toMin: 2.5, reason: 'solvent' }],
    });
    expect(readTexts(textsOf(parameters))).toEqual({ ok: true, parameters });
    expect(readTexts(textsOf(defaultIntegrationParameters))).toEqual({
      ok: true,
      parameters: defaultIntegrationParameters,
    });
  });

  it('reads a decimal comma, and names the field that is out of its limits or empty', () => {
    const texts = textsOf(defaultIntegrationParameters);
    texts.plain.minimumAreaPercent = '0,05';
    expect(readTexts(texts)).toMatchObject({ ok: true, parameters: { minimumAreaPercent: 0.05 } });
    texts.plain.minimumAreaPercent = '90';
    texts.plain.minimumSignalToNoise = '';
    texts.exclude = [{ fromMin: '3', toMin: '2', reason: 'solvent' }];
    const result = readTexts(texts);
    expect(result.ok).toBe(false);
    expect(Object.keys((result as { problems: object }).problems).sort()).toEqual([
      'exclude.0.toMin',
      'minimumAreaPercent',
      'minimumSignalToNoise',
    ]);
  });
});
