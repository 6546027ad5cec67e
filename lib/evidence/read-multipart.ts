import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { Busboy, type BusboyInstance } from '@fastify/busboy';
import { invalidField, Problem } from '@/lib/errors';

export type Part = { stream: Readable; fileName: string };

const malformed = () =>
  new Problem('malformed', 'The multipart body is not complete or not readable. Send the file again.');

const limits = { fields: 20, fieldSize: 10_000, headerPairs: 50 };

function parserFor(contentType: string): BusboyInstance {
  try {
    return new Busboy({ headers: { 'content-type': contentType }, limits });
  } catch {
    throw malformed();
  }
}

/**
 * Streams the one part `file` of a multipart body (RFC 7578) to `take` and returns what it made of it; nothing is
 * held in memory. 400 for a broken body, 422 for a missing, second or differently named file: what `take` made by
 * then is given to `undo`.
 */
export async function readMultipart<T>(
  source: Readable,
  contentType: string,
  take: (part: Part) => Promise<T>,
  undo: (taken: T) => Promise<void>,
): Promise<T> {
  const parser = parserFor(contentType);
  const stop = new AbortController();
  let current: Readable | undefined;
  let taking: Promise<T> | undefined;
  let problem: unknown = null;
  parser.on('file', (field, stream, fileName) => {
    if (field !== 'file') problem ??= invalidField(field, 'Send the file in a part that is called "file".');
    else if (taking) problem ??= invalidField('file', 'Send one file in each request.');
    if (problem) return void stream.resume();
    // The taker sees an error as it reads; one that comes when it no longer does must not end the process.
    stream.on('error', () => undefined);
    current = stream;
    taking = take({ stream, fileName: fileName ?? '' });
    taking.catch((error: unknown) => {
      problem ??= error;
      stop.abort();
    });
  });
  try {
    await pipeline(source, parser, { signal: stop.signal });
  } catch {
    problem ??= malformed();
    // Otherwise the taker would wait for ever for the rest of a part that is not coming.
    current?.destroy(malformed());
  }
  const taken = await taking?.catch(() => undefined);
  if (!problem && taken !== undefined) return taken;
  if (taken !== undefined) await undo(taken);
  throw problem ?? invalidField('file', 'Send the file in a part that is called "file".');
}
