import { expect, it } from 'vitest';
import { sniffText } from './sniff-text';

const of = (text: string, complete = true) => sniffText(Buffer.from(text, 'utf8'), complete);
const rows = (delimiter: string, decimal = '.') =>
  Array.from({ length: 20 }, (_, i) => `0${decimal}${i}${delimiter}${i}${decimal}5`).join('\n');

it('knows a table by its lines of numbers, whatever the delimiter and the decimal sign', () => {
  expect(of(`time,signal\n${rows(',')}`)).toBe('text/csv');
  expect(of(`Zeit;Signal\n${rows(';', ',')}`)).toBe('text/csv');
  expect(of(`time\tsignal\n${rows('\t', ',')}`)).toBe('text/tab-separated-values');
  expect(of(rows(' '))).toBe('text/csv');
});

it('finds the table after a long header', () => {
  const header = Array.from({ length: 60 }, (_, i) => `Setting ${i}: as usual`).join('\r\n');
  expect(of(`${header}\r\n${rows('\t')}`)).toBe('text/tab-separated-values');
});

it('knows JCAMP-DX by its first label, also after comments and a byte-order mark', () => {
  expect(of('##TITLE= crude\n##JCAMP-DX= 5.01\n')).toBe('chemical/x-jcamp-dx');
  expect(of('\uFEFF$$ made at the bench\n  ##title=x\n')).toBe('chemical/x-jcamp-dx');
});

it('takes prose as plain text, also prose with numbers in it', () => {
  expect(of('Fraction 3 smelled of pears.\nRefluxed 2 h at 78.2 degrees, then 1 h at 80.\n')).toBe(
    'text/plain',
  );
});

it('reads UTF-16 and Latin-1', () => {
  expect(sniffText(Buffer.from(`\uFEFF${rows('\t')}`, 'utf16le'), true)).toBe('text/tab-separated-values');
  expect(sniffText(Buffer.from(`Temp °C;mV\n${rows(';')}`, 'latin1'), true)).toBe('text/csv');
});

it('does not take bytes for text, nor emptiness for a document', () => {
  expect(sniffText(Uint8Array.from([0x4d, 0x5a, 0x00, 0x01]), true)).toBeNull();
  expect(of('  \n\n')).toBeNull();
});

it('does not stumble over a character or a line that is cut off at the end of the sample', () => {
  const cut = Buffer.from(`time;signal µV\n${rows(';')}\n1.0;µ`, 'utf8').subarray(0, -1);
  expect(sniffText(cut, false)).toBe('text/csv');
});
