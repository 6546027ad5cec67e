import { z } from 'zod';
import { errorTable } from '@/lib/errors';
import type { RouteFacts } from '@/lib/http/route';
import { version } from '@/package.json';

export const methods = ['GET', 'POST', 'PATCH', 'DELETE'] as const;
export type Method = (typeof methods)[number];

/** A route module as it is imported: handlers by method, each with its facts. */
export type RouteModule = Partial<Record<Method, unknown>>;

type JsonSchema = Record<string, unknown>;

function toJsonSchema(schema: z.ZodType, io: 'input' | 'output'): JsonSchema {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as JsonSchema;
  return rest;
}

function parametersOf(schema: z.ZodType | undefined, place: 'path' | 'query') {
  if (!schema) return [];
  const { properties = {}, required = [] } = toJsonSchema(schema, 'input') as {
    properties?: Record<string, JsonSchema>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, { description, ...rest }]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    ...(description ? { description } : {}),
    schema: rest,
  }));
}

const problem = { $ref: '#/components/schemas/Problem' };

/** The refusals that an operation can answer with, from what it checks. */
function refusalsOf(facts: RouteFacts, method: Method) {
  const codes = new Set([400, 500, 503]);
  if (facts.access !== 'public') [401, 403].forEach((code) => codes.add(code));
  if (facts.params) codes.add(404);
  if (facts.body) [413, 415, 422].forEach((code) => codes.add(code));
  if (facts.rawBody) [413, 415, 422].forEach((code) => codes.add(code));
  if (method === 'PATCH') [409, 412, 428].forEach((code) => codes.add(code));
  if (method === 'POST') [409, 429].forEach((code) => codes.add(code));
  const titles = (status: number) => [
    ...new Set(Object.values(errorTable).flatMap((e) => (e.status === status ? [e.title as string] : []))),
  ];
  return Object.fromEntries(
    [...codes].sort().map((status) => [
      String(status),
      {
        description: titles(status).join(' / '),
        content: { 'application/problem+json': { schema: problem } },
      },
    ]),
  );
}

function bodyOf(facts: RouteFacts) {
  if (facts.body)
    return { required: true, content: { 'application/json': { schema: toJsonSchema(facts.body, 'input') } } };
  if (!facts.rawBody) return undefined;
  const bytes = { schema: { type: 'string', contentMediaType: 'application/octet-stream' } };
  return {
    required: true,
    content: Object.fromEntries(facts.rawBody.contentTypes.map((type) => [type, bytes])),
  };
}

function operationOf(facts: RouteFacts, method: Method, path: string) {
  const requestBody = bodyOf(facts);
  const content = facts.response
    ? { 'application/json': { schema: toJsonSchema(facts.response, 'output') } }
    : facts.responseType
      ? { [facts.responseType]: {} }
      : undefined;
  return {
    summary: facts.summary,
    operationId: `${method.toLowerCase()} ${path}`.replace(/[^a-z0-9]+/gi, '-').replace(/-$/, ''),
    parameters: [...parametersOf(facts.params, 'path'), ...parametersOf(facts.query, 'query')],
    ...(requestBody && { requestBody }),
    responses: {
      [String(facts.status ?? 200)]: { description: facts.summary, ...(content && { content }) },
      ...refusalsOf(facts, method),
    },
    ...(facts.access === 'public' && { security: [] }),
  };
}

/** The OpenAPI 3.1 document of the routes, from the same schemas that check the requests. */
export function buildDocument(routes: Record<string, RouteModule>, serverUrl: string) {
  const paths = Object.entries(routes).map(([path, module]) => {
    const operations = methods.flatMap((method) => {
      const facts = (module[method] as { facts?: RouteFacts } | undefined)?.facts;
      return facts ? [[method.toLowerCase(), operationOf(facts, method, path)] as const] : [];
    });
    return [path, Object.fromEntries(operations)] as const;
  });
  return {
    openapi: '3.1.0',
    info: {
      title: 'Heartcut',
      version,
      description:
        'Purity evidence for distillation fractions. Numbers carry their unit in their name; times are ISO 8601 in UTC.',
    },
    servers: [{ url: serverUrl }],
    security: [{ bearer: [] }, { session: [] }],
    paths: Object.fromEntries(paths),
    components: {
      securitySchemes: {
        bearer: { type: 'http', scheme: 'bearer', description: 'An access token of an instrument.' },
        session: {
          type: 'apiKey',
          in: 'cookie',
          name: 'next-auth.session-token',
          description: 'Signed in by /api/auth.',
        },
      },
      schemas: {
        Problem: toJsonSchema(
          z
            .object({
              type: z.string(),
              title: z.string(),
              status: z.number().int(),
              detail: z.string().describe('what happened and what to do next'),
              instance: z.string(),
              errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
            })
            .describe('RFC 9457 problem details'),
          'output',
        ),
      },
    },
  };
}
