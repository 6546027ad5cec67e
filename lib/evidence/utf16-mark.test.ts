import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { sniffType } from './sniff-type';

async function typeOf(bytes: Uint8Array): Promise<string> {
  const folder = await mkdtemp(join(tmpdir(), 'sniff-'));
  try {
    await writeFile(join(folder, 'file'), bytes);
    return await sniffType(join(folder, 'file'), bytes.length);
  } finally {
    await rm(folder, { recursive: true });
  }
}

const table = `\ufeffTime;Signal\r\n${Array.from({ length: 20 }, (_, row) => `0,${10 + row};1${row}`).join('\r\n')}\r\n`;

it('takes a table in UTF-16 with its mark for a table, either way round', async () => {
  const little = Buffer.from(table, 'utf16le');
  expect(await typeOf(little)).toBe('text/csv');
  expect(await typeOf(Buffer.from(little).swap16())).toBe('text/csv');
});

it('still refuses a sound file that begins with the same bytes', async () => {
  // An MPEG frame header as of ISO/IEC 11172-3 (FF FE), then bytes that are no text.
  const sound = Buffer.concat([Buffer.from([0xff, 0xfe, 0x90, 0x00]), Buffer.alloc(2000)]);
  await expect(typeOf(sound)).rejects.toMatchObject({ code: 'unsupported-type' });
});
