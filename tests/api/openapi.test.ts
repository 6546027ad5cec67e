import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { anonymous, stopTestServer } from '../support/test-server';
import { matrix } from './authorisation-matrix';

type Operation = {
  summary: string;
  operationId: string;
  parameters: { name: string; in: string; required: boolean }[];
  requestBody?: unknown;
  responses: Record<string, unknown>;
};
let document: {
  openapi: string;
  paths: Record<string, Record<string, Operation>>;
  components: { schemas: Record<string, unknown> };
};

beforeAll(async () => {
  document = (await (await anonymous()).get('/api/v1/openapi.json').expect(200)).body;
});
afterAll(stopTestServer);

const operations = () =>
  Object.entries(document.paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, operation]) => ({ path, method, operation })),
  );

describe('the OpenAPI document', () => {
  it('is of version 3.1 and describes every operation that the rights table knows', () => {
    expect(document.openapi).toBe('3.1.0');
    const described = operations().map(({ path, method }) => `${method.toUpperCase()} ${path}`);
    const known = matrix
      .filter((row) => row.route.startsWith('/api/') && !row.route.endsWith('openapi.json'))
      .map((row) => `${row.method} ${row.route.replace(/\[(\w+)\]/g, '{$1}')}`);
    expect(described.sort()).toEqual(known.sort());
  });

  it('names each parameter of a path, and no operation twice', () => {
    for (const { path, operation } of operations()) {
      const inPath = [...path.matchAll(/\{(\w+)\}/g)].map((match) => match[1]);
      expect(operation.parameters.filter((p) => p.in === 'path').map((p) => p.name)).toEqual(inPath);
    }
    const ids = operations().map(({ operation }) => operation.operationId);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('takes limits from the schemas that check the requests', () => {
    const list = document.paths['/api/v1/fractions']!.get!;
    expect(list.parameters.find((p) => p.name === 'limit')).toMatchObject({
      schema: { minimum: 1, maximum: 200, default: 50 },
    });
    expect(list.parameters.some((p) => p.name === 'offset')).toBe(false);
    const run = JSON.stringify(document.paths['/api/v1/runs']!.post!.requestBody);
    for (const field of ['targetCompound', 'knownImpurities', 'technique', 'chargeMassG', 'chargeSource'])
      expect(run).toContain(`"${field}"`);
  });

  it('resolves every reference it makes', () => {
    const references = [...JSON.stringify(document).matchAll(/"\$ref":"#\/components\/schemas\/(\w+)"/g)].map(
      (m) => m[1]!,
    );
    expect(references.length).toBeGreaterThan(50);
    for (const name of new Set(references)) expect(document.components.schemas).toHaveProperty(name);
  });
});
