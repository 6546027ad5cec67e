import type { z } from 'zod';
import { type FieldError, Problem } from '@/lib/errors';
import { listForbiddenCharacters } from './forbidden-characters';
import './plain-messages';

/** Large enough for 10,000 log readings in one call. */
const jsonLimitBytes = 4 * 1024 * 1024;

function fieldErrors(error: z.ZodError) {
  return error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message }));
}

/** The first message as it stands when it is of the whole body, or after the field's name. */
function asSentence([first]: FieldError[]): string {
  if (!first) return 'Check the content.';
  return first.path ? `Check "${first.path}": ${first.message}` : first.message;
}

async function readText(request: Request, limit: number): Promise<string> {
  if (!request.body) return '';
  const parts: Uint8Array[] = [];
  let size = 0;
  for await (const part of request.body as unknown as AsyncIterable<Uint8Array>) {
    size += part.byteLength;
    if (size > limit)
      throw new Problem(
        'too-large',
        `A JSON body may have ${limit / 1024 / 1024} MB. Send it in several calls.`,
      );
    parts.push(part);
  }
  return new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(parts));
}

/** Reads a JSON body and checks it: 415, 400 or 422 with the fields named. Returns the parsed value and its text. */
export async function readJson<S extends z.ZodType>(
  request: Request,
  schema: S,
): Promise<{ value: z.output<S>; text: string }> {
  const type = request.headers.get('content-type')?.split(';')[0]?.trim().toLowerCase();
  if (type !== 'application/json') {
    throw new Problem('unsupported-type', 'Send JSON with the header Content-Type: application/json.');
  }
  let text: string;
  let json: unknown;
  try {
    text = await readText(request, jsonLimitBytes);
    json = JSON.parse(text);
  } catch (error) {
    if (error instanceof Problem) throw error;
    throw new Problem('malformed', 'The body is not valid JSON in UTF-8. Check quotes, commas and braces.');
  }
  const forbidden = listForbiddenCharacters(json);
  if (forbidden.length > 0) throw new Problem('invalid', asSentence(forbidden), { errors: forbidden });
  return { value: check(schema, json), text };
}

export function check<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const errors = fieldErrors(parsed.error);
  throw new Problem('invalid', asSentence(errors), { errors });
}

/** Query parameters by schema. What is unknown or out of range is a 400 that names it; an empty one counts as left out. */
export function readQuery<S extends z.ZodType>(url: URL, schema: S): z.output<S> {
  const given: Record<string, string> = {};
  for (const [name, value] of url.searchParams) {
    if (name in given) throw new Problem('malformed', `The query parameter "${name}" is given twice.`);
    // A form sends its empty boxes too; as a number, an empty text would count as 0.
    if (value.trim() !== '') given[name] = value;
  }
  const parsed = schema.safeParse(given);
  if (parsed.success) return parsed.data;
  const errors = fieldErrors(parsed.error);
  throw new Problem(
    'malformed',
    `Check the query parameters: ${errors.map((e) => (e.path ? `"${e.path}": ${e.message}` : e.message)).join(' ')}`,
    { errors },
  );
}
