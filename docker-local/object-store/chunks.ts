import { createHash } from 'node:crypto';
import { StoreError } from './errors';
import type { VerifiedSignature } from './signature';

const EMPTY_SHA256 = createHash('sha256').digest('hex');
const MAX_LINE_BYTES = 8192;

/** Reads lines and counted bytes from a stream without holding more than one network buffer. */
class ByteReader {
  private pending: Buffer = Buffer.alloc(0);
  private readonly iterator: AsyncIterator<Buffer>;

  constructor(source: AsyncIterable<Buffer>) {
    this.iterator = source[Symbol.asyncIterator]();
  }

  private async fill(): Promise<boolean> {
    const { value, done } = await this.iterator.next();
    if (done) return false;
    this.pending = this.pending.length ? Buffer.concat([this.pending, value]) : value;
    return true;
  }

  async line(): Promise<string> {
    for (;;) {
      const end = this.pending.indexOf('\r\n');
      if (end >= 0) {
        const text = this.pending.toString('latin1', 0, end);
        this.pending = this.pending.subarray(end + 2);
        return text;
      }
      if (this.pending.length > MAX_LINE_BYTES || !(await this.fill())) {
        throw new StoreError('IncompleteBody', 'The chunked body ended too early or is malformed.');
      }
    }
  }

  async *take(byteCount: number): AsyncGenerator<Buffer> {
    let left = byteCount;
    while (left > 0) {
      if (this.pending.length === 0 && !(await this.fill())) {
        throw new StoreError('IncompleteBody', 'The body ended inside a chunk.');
      }
      const part = this.pending.subarray(0, left);
      this.pending = this.pending.subarray(part.length);
      left -= part.length;
      yield part;
    }
  }
}

/**
 * Decodes an `aws-chunked` body, checking each chunk's and the trailer's signature where the form is a signed one.
 * Trailing headers are put into `trailers` (lower case). Bytes are yielded before their chunk is verified, so a
 * consumer must not publish them until the generator has ended.
 * Source: Amazon S3 API Reference, "Signature Calculations for the Authorization Header: Transferring Payload in
 * Multiple Chunks (Chunked Upload)" and "... Including Trailing Headers".
 */
export async function* decodeChunks(
  source: AsyncIterable<Buffer>,
  signature: VerifiedSignature,
  trailers: Record<string, string>,
): AsyncGenerator<Buffer> {
  const form = signature.payloadHash;
  const signed = form.startsWith('STREAMING-AWS4-HMAC-SHA256-PAYLOAD');
  if (!signed && form !== 'STREAMING-UNSIGNED-PAYLOAD-TRAILER')
    throw new StoreError('NotImplemented', `${form} is not known here.`);
  const withTrailer = form.endsWith('-TRAILER');
  const reader = new ByteReader(source);
  let previous = signature.seedSignature;

  const requireChain = async (kind: 'PAYLOAD' | 'TRAILER', middle: string[], given: string | undefined) => {
    const text = [`AWS4-HMAC-SHA256-${kind}`, signature.amzDate, signature.scope, previous, ...middle].join(
      '\n',
    );
    const expected = await signature.signText(text);
    if (expected !== given)
      throw new StoreError('SignatureDoesNotMatch', 'The signature of a chunk does not match.');
    previous = expected;
  };

  for (;;) {
    const header = await reader.line();
    const match = /^([0-9a-fA-F]{1,8})(?:;chunk-signature=([0-9a-f]{64}))?$/.exec(header);
    if (!match) throw new StoreError('IncompleteBody', 'A chunk header is malformed.');
    const size = parseInt(match[1]!, 16);
    const hash = createHash('sha256');
    for await (const part of reader.take(size)) {
      if (signed) hash.update(part);
      yield part;
    }
    if (signed) await requireChain('PAYLOAD', [EMPTY_SHA256, hash.digest('hex')], match[2]);
    if (size === 0) break;
    if ((await reader.line()) !== '')
      throw new StoreError('IncompleteBody', 'A chunk is longer than it says.');
  }
  if (!withTrailer) return;
  let canonical = '';
  let trailerSignature: string | undefined;
  for (let line = await reader.line(); line !== ''; line = await reader.line()) {
    const cut = line.indexOf(':');
    const [name, value] = [line.slice(0, cut).trim().toLowerCase(), line.slice(cut + 1).trim()];
    if (name === 'x-amz-trailer-signature') trailerSignature = value;
    else {
      trailers[name] = value;
      canonical += `${name}:${value}\n`;
    }
  }
  if (signed)
    await requireChain('TRAILER', [createHash('sha256').update(canonical).digest('hex')], trailerSignature);
}
