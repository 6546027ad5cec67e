import { expect, it } from 'vitest';
import { sniffHeif } from './heif-brands';

function fileTypeBox(major: string, ...compatible: string[]): Buffer {
  const box = Buffer.alloc(16 + 4 * compatible.length);
  box.writeUInt32BE(box.length, 0);
  box.write(`ftyp${major}`, 4, 'latin1');
  compatible.forEach((brand, i) => box.write(brand, 16 + 4 * i, 'latin1'));
  return Buffer.concat([box, Buffer.alloc(40)]);
}

it('knows a phone’s HEIC photo by its major or a compatible brand (ISO/IEC 23008-12)', () => {
  expect(sniffHeif(fileTypeBox('heic', 'mif1', 'heic'))).toBe('image/heic');
  expect(sniffHeif(fileTypeBox('mif1', 'mif1', 'heic', 'miaf'))).toBe('image/heic');
  expect(sniffHeif(fileTypeBox('heix', 'mif1'))).toBe('image/heic');
});

it('tells AV1 pictures in the same container apart', () => {
  expect(sniffHeif(fileTypeBox('avif', 'mif1', 'miaf'))).toBe('image/avif');
  expect(sniffHeif(fileTypeBox('mif1', 'avif', 'miaf'))).toBe('image/avif');
});

it('calls the plain container HEIF, and everything else nothing', () => {
  expect(sniffHeif(fileTypeBox('mif1', 'miaf'))).toBe('image/heif');
  expect(sniffHeif(fileTypeBox('isom', 'mp42'))).toBeNull();
  expect(sniffHeif(Buffer.from('no box at all, but long enough'))).toBeNull();
  expect(sniffHeif(Buffer.alloc(4))).toBeNull();
});
