import { expect, it } from 'vitest';
import { cleanFileName, contentDisposition, readFileNameHeader } from './file-name';

it('reads a name in the extended notation of RFC 8187', () => {
  // The example of RFC 8187, section 3.2.3.
  expect(readFileNameHeader("UTF-8''%c2%a3%20and%20%e2%82%ac%20rates")).toBe('£ and € rates');
  expect(readFileNameHeader("iso-8859-1'en'%A3%20rates")).toBe('£ rates');
});

it('reads plain, quoted, percent-encoded and raw UTF-8 names', () => {
  expect(readFileNameHeader('run 12.csv')).toBe('run 12.csv');
  expect(readFileNameHeader('"a \\"b\\".csv"')).toBe('a "b".csv');
  expect(readFileNameHeader('plate%20%CE%B1.jpg')).toBe('plate α.jpg');
  expect(readFileNameHeader('100% pure.csv')).toBe('100% pure.csv');
  expect(readFileNameHeader(Buffer.from('α.jpg', 'utf8').toString('latin1'))).toBe('α.jpg');
  expect(readFileNameHeader("UTF-8''%ff")).toBeNull();
});

it('keeps no path, no control character and no character that turns the reading direction', () => {
  expect(cleanFileName('C:\\data\\..\\run.cdf')).toBe('run.cdf');
  expect(cleanFileName('../../etc/passwd')).toBe('passwd');
  expect(cleanFileName('photo\u202egpj.exe\r\n')).toBe('photogpj.exe');
  expect(cleanFileName('..', 'plate.jpg')).toBe('plate.jpg');
});

it('shortens a long name and keeps its ending', () => {
  const name = cleanFileName(`${'x'.repeat(400)}.jpeg`);
  expect(name).toHaveLength(200);
  expect(name.endsWith('.jpeg')).toBe(true);
});

it('writes a disposition that old and new readers understand', () => {
  expect(contentDisposition('attachment', "naïve 'plate'.jpg")).toBe(
    `attachment; filename="na_ve 'plate'.jpg"; filename*=UTF-8''na%C3%AFve%20%27plate%27.jpg`,
  );
});
