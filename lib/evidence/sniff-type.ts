import { open } from 'node:fs/promises';
import { fileTypeFromBuffer } from 'file-type';
import { Problem } from '@/lib/errors';
import { sniffHeif } from './heif-brands';
import { usualKindOf, whatWeTake } from './kinds';
import { hasUtf16Mark, sniffText } from './sniff-text';

const sampleBytes = 256 * 1024;

async function readSample(path: string): Promise<Buffer> {
  const handle = await open(path, 'r');
  try {
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(sampleBytes), 0, sampleBytes, 0);
    return buffer.subarray(0, bytesRead);
  } finally {
    await handle.close();
  }
}

function isNetCdfClassic(sample: Buffer): boolean {
  // "CDF" and the version: 1 classic, 2 with 64-bit offsets (NetCDF classic format specification, Unidata).
  return sample.subarray(0, 3).toString('latin1') === 'CDF' && (sample[3] === 1 || sample[3] === 2);
}

function refuse(found: string, advice = ''): Problem {
  return new Problem('unsupported-type', `This file is ${found}. ${advice}${whatWeTake}`);
}

/**
 * The media type of a file from its bytes, whatever its name or sender says. 415 naming what was found for
 * everything that is neither photo nor trace nor document; 422 for an empty file.
 */
export async function sniffType(path: string, byteLength: number): Promise<string> {
  if (byteLength === 0)
    throw new Problem(
      'invalid',
      'The file is empty. Check that it was written completely, then send it again.',
    );
  const sample = await readSample(path);
  if (isNetCdfClassic(sample)) return 'application/x-netcdf';
  const heif = sniffHeif(sample);
  if (heif === 'image/avif')
    throw refuse('an AVIF photo', 'Set the camera to JPEG or HEIC and take the photo again. ');
  if (heif) return heif;
  // The mark FF FE also begins some sound files; in a file that is text after it, it is the mark of UTF-16.
  const marked = hasUtf16Mark(sample) ? sniffText(sample, byteLength <= sample.length) : null;
  const signature = marked ? undefined : await fileTypeFromBuffer(sample).catch(() => undefined);
  if (signature) {
    const { mime } = signature;
    if (usualKindOf(mime)) return mime;
    if (!mime.startsWith('text/')) throw refuse(`of type ${mime}`);
  }
  const text = marked ?? sniffText(sample, byteLength <= sample.length);
  if (!text) throw refuse('of a type that is not known here');
  if (/^\uFEFF?\s*<(?:\?xml|!doctype|html|svg)/i.test(sample.subarray(0, 500).toString('utf8')))
    throw refuse('a page or drawing in XML or HTML');
  return text;
}
