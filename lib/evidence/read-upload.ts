import { createHash } from 'node:crypto';
import { Readable, Transform } from 'node:stream';
import { Problem } from '@/lib/errors';
import { type SpooledFile, spoolFile, TooLargeError } from '@/storage/spool-file';
import { type GivenDigest, readContentDigest, requireSameDigest } from './content-digest';
import { cleanFileName, readFileNameHeader } from './file-name';
import { type EvidenceKind, kindFacts, largestBytes } from './kinds';
import { readMultipart } from './read-multipart';

export type Upload = { file: SpooledFile; fileName: string };

function tooLarge(maxBytes: number): Problem {
  return new Problem(
    'too-large',
    `The file is larger than ${maxBytes / 1024 / 1024} MB, the most for its kind. Send a smaller export, or split it.`,
  );
}

/** Counts nothing and changes nothing: hashes what passes, when the sender gave a digest of the whole body. */
function digestMeter(given: GivenDigest | null) {
  const hash = given ? createHash(given.algorithm) : null;
  const stream = new Transform({
    transform(bytes: Buffer, _encoding, done) {
      hash?.update(bytes);
      done(null, bytes);
    },
  });
  return { stream, check: () => hash && requireSameDigest(given, hash.digest()) };
}

async function spool(stream: AsyncIterable<Uint8Array>, maxBytes: number): Promise<SpooledFile> {
  try {
    return await spoolFile(stream, { maxBytes });
  } catch (error) {
    if (error instanceof TooLargeError) throw tooLarge(maxBytes);
    if (error instanceof Problem) throw error;
    throw new Problem(
      'malformed',
      'The upload broke off before its end. Nothing was kept; send the file again.',
    );
  }
}

function nameOf(request: Request): string {
  const header = request.headers.get('x-filename');
  if (header === null)
    throw new Problem(
      'malformed',
      "Send the file's name in the header X-Filename, percent-encoded or as UTF-8''name, or send the file as multipart part \"file\".",
    );
  const name = readFileNameHeader(header);
  if (name === null)
    throw new Problem(
      'malformed',
      "The header X-Filename cannot be read. Send it as UTF-8''name, percent-encoded.",
    );
  return name;
}

/**
 * Takes the file of a request to the spool, raw or as multipart, with flat memory, and checks its Content-Digest.
 * The caller must discard the file. 400 for a digest that does not match and for a body that broke off, 413 when it
 * is too large for its kind; in each case nothing is left.
 */
export async function readUpload(request: Request, kind: EvidenceKind | undefined): Promise<Upload> {
  const given = readContentDigest(request.headers.get('content-digest'));
  const maxBytes = kind ? kindFacts[kind].maxBytes : largestBytes;
  if (Number(request.headers.get('content-length')) > maxBytes + 100_000) throw tooLarge(maxBytes);
  if (!request.body)
    throw new Problem('malformed', 'The request has no body. Send the bytes of the file in it.');
  const type = request.headers.get('content-type') ?? '';
  const isMultipart = type.toLowerCase().startsWith('multipart/form-data');
  const rawName = isMultipart ? '' : nameOf(request);

  const meter = digestMeter(given);
  const body = Readable.fromWeb(request.body as import('node:stream/web').ReadableStream);
  body.on('error', (error) => meter.stream.destroy(error));
  meter.stream.on('close', () => body.destroy());
  const source = body.pipe(meter.stream);
  const upload = isMultipart
    ? await readMultipart(
        source,
        type,
        async (part) => ({ file: await spool(part.stream, maxBytes), fileName: part.fileName }),
        (taken) => taken.file.discard(),
      )
    : { file: await spool(source, maxBytes), fileName: rawName };
  try {
    meter.check();
  } catch (error) {
    await upload.file.discard();
    throw error;
  }
  return { file: upload.file, fileName: cleanFileName(upload.fileName) };
}
