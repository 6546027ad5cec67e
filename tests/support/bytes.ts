import type { Response } from 'superagent';

/** Keeps the body of a supertest answer as bytes: `.buffer(true).parse(asBytes)`. */
export function asBytes(response: Response, done: (error: Error | null, body: Buffer) => void): void {
  const pieces: Buffer[] = [];
  const stream = response as unknown as NodeJS.ReadableStream;
  stream.on('data', (piece: Buffer) => pieces.push(piece));
  stream.on('end', () => done(null, Buffer.concat(pieces)));
  stream.on('error', (error: Error) => done(error, Buffer.alloc(0)));
}
