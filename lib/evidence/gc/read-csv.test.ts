import { existsSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { integrate } from './integrate';
import { readCsvTrace, type CsvReadOptions } from './read-csv';
import { scanNumber } from './csv-number';

const bytesOf = (text: string) => new TextEncoder().encode(text);

function read(text: string | Uint8Array, options: CsvReadOptions = {}) {
  const result = readCsvTrace(typeof text === 'string' ? bytesOf(text) : text, options);
  if (!result.ok) throw new Error(`${result.problem.code}: ${result.problem.message}`);
  return result;
}

function refusal(text: string | Uint8Array, options: CsvReadOptions = {}) {
  const result = readCsvTrace(typeof text === 'string' ? bytesOf(text) : text, options);
  if (result.ok) throw new Error('the table was read');
  return result.problem;
}

function utf16(text: string, littleEndian: boolean, mark: boolean): Uint8Array {
  const units = (mark ? '\ufeff' : '') + text;
  const bytes = new Uint8Array(units.length * 2);
  const view = new DataView(bytes.buffer);
  for (let i = 0; i < units.length; i++) view.setUint16(2 * i, units.charCodeAt(i), littleEndian);
  return bytes;
}

describe('a table that is written in the usual ways', () => {
  it.each([
    ['comma', 'Time (min),Signal (pA)\n0.00,1.5\n0.01,2.5\n0.02,-3\n', ',', '.'],
    ['semicolon with decimal comma', 'Zeit [min];Signal\r\n0,00;1,5\r\n0,01;2,5\r\n0,02;-3\r\n', ';', ','],
    ['tab with decimal comma', 'time (min)\tmV\n0,00\t1,5\n0,01\t2,5\n0,02\t-3', 'tab', ','],
    ['tab', 'time (min)\tmV\n0.00\t1.5\n0.01\t2.5\n0.02\t-3', 'tab', '.'],
    [
      'blanks in columns',
      ' Time/min    Signal\n  0.00      1.5\n  0.01      2.5\n  0.02     -3\n',
      'space',
      '.',
    ],
    ['blanks with decimal comma', '# Time min\n0,00 1,5\n0,01 2,5\n0,02 -3\n', 'space', ','],
    ['quoted cells', '"Time (min)","Signal"\n"0.00","1.5"\n"0.01","2.5"\n"0.02","-3"\n', ',', '.'],
    ['blank after comma', 'Time (min), Signal\n0.00, 1.5\n0.01, 2.5\n0.02, -3\n', ',', '.'],
    ['lone carriage returns', 'Time (min),Signal\r0.00,1.5\r0.01,2.5\r0.02,-3\r', ',', '.'],
    ['blank lines and comments', 'Time (min),Signal\n0.00,1.5\n\n# pause\n0.01,2.5\n0.02,-3\n\n\n', ',', '.'],
    ['delimiter at the end of lines', 'Time (min);Signal;\n0.00;1.5;\n0.01;2.5;\n0.02;-3;\n', ';', '.'],
    ['exponents', 'Time (min),Signal\n0e0,1.5E0\n1e-2,25e-1\n2E-2,-3.0e+0\n', ',', '.'],
  ])('is read: %s', (_, text, delimiter, decimal) => {
    const { timeMin, signal, detected } = read(text);
    expect([...timeMin]).toEqual([0, 0.01, 0.02]);
    expect([...signal]).toEqual([1.5, 2.5, -3]);
    expect(detected).toMatchObject({ delimiter, decimal, timeUnit: 'min', timeUnitFrom: 'heading' });
  });

  it.each([
    [
      'UTF-8 with a byte order mark',
      new Uint8Array([0xef, 0xbb, 0xbf, ...bytesOf('Time (s);µV\n60;1,5\n90;2,5\n')]),
      'utf-8 with BOM',
    ],
    ['UTF-16 LE', utf16('Time (s);µV\n60;1,5\n90;2,5\n', true, true), 'utf-16le'],
    ['UTF-16 BE', utf16('Time (s);µV\n60;1,5\n90;2,5\n', false, true), 'utf-16be'],
    ['UTF-16 LE without a mark', utf16('Time (s);mV\n60;1,5\n90;2,5\n', true, false), 'utf-16le'],
    ['UTF-16 BE without a mark', utf16('Time (s);mV\n60;1,5\n90;2,5\n', false, false), 'utf-16be'],
  ])('is read in %s, seconds turned into minutes', (_, bytes, encoding) => {
    const { timeMin, signal, detected } = read(bytes);
    expect([...timeMin]).toEqual([1, 1.5]);
    expect([...signal]).toEqual([1.5, 2.5]);
    expect(detected).toMatchObject({ encoding, timeUnit: 's', delimiter: ';', decimal: ',' });
  });

  it('takes a long heading with numbers in it for a heading', () => {
    const head = 'Sample;F3\nInjection volume;1,0\nDate;2026-03-04\n\nDetector;FID\nTime unit;s\nt;y\n';
    const { detected, timeMin } = read(`${head}0,0;1\n0,5;2\n1,0;3\n`);
    expect(detected).toMatchObject({
      headerLines: 7,
      timeUnit: 's',
      timeUnitFrom: 'heading',
      columns: ['t', 'y'],
    });
    expect(timeMin[1]).toBe(0.5 / 60);
  });

  it('chooses columns by their names, past an index', () => {
    const { detected, timeMin, signal } = read(
      'No.,Temp,RT (min),FID signal\n1,40,0.1,5\n2,41,0.2,6\n3,42,0.3,7\n',
    );
    expect(detected).toMatchObject({ timeColumn: 2, signalColumn: 3 });
    expect([...timeMin]).toEqual([0.1, 0.2, 0.3]);
    expect([...signal]).toEqual([5, 6, 7]);
  });

  it('says that the unit of time is assumed when no heading tells it', () => {
    const rows = (last: number) => Array.from({ length: 11 }, (_, i) => `${(i * last) / 10},${i}`).join('\n');
    expect(read(rows(12.5)).detected).toMatchObject({ timeUnit: 'min', timeUnitFrom: 'assumed' });
    expect(read(rows(1205)).detected).toMatchObject({ timeUnit: 's', timeUnitFrom: 'assumed' });
  });

  it('does what the options say instead of what it would detect', () => {
    const text = 'a;b;c\n1;10;100\n2;20;200\n3;30;301\n';
    const { timeMin, signal, detected } = read(text, { timeColumn: 'B', signalColumn: 2, timeUnit: 's' });
    expect([...timeMin]).toEqual([10 / 60, 20 / 60, 30 / 60]);
    expect([...signal]).toEqual([100, 200, 301]);
    expect(detected.timeUnitFrom).toBe('given');
    expect([...read('0,5\n1,5\n2,5\n', { delimiter: ';', decimal: ',', samplingHz: 1 }).signal]).toEqual([
      0.5, 1.5, 2.5,
    ]);
  });

  it('makes the times from a sampling rate when there is one column', () => {
    const { timeMin, detected } = read('5\n6\n7\n', { samplingHz: 10 });
    expect(timeMin[2]).toBeCloseTo(0.2 / 60, 15);
    expect(detected).toMatchObject({ timeColumn: null, timeUnitFrom: 'sampling' });
  });
});

describe('a table that cannot be trusted', () => {
  it.each([
    ['an empty file', '', 'empty', null],
    ['only blank lines', '\n\n  \n', 'empty', null],
    ['text without numbers', 'hello\nworld\n', 'no numbers', null],
    ['one column', '1.5\n2.5\n3.5\n', 'one column', null],
    ['a last line that is cut off', 'Time (min),Signal\n0.1,1\n0.2,2\n0.3', 'truncated', 4],
    [
      'a last line that is cut off after the delimiter',
      'Time (min),Signal\n0.1,1\n0.2,2\n0.3,',
      'truncated',
      4,
    ],
    ['NaN', 'Time (min),Signal\n0.1,1\n0.2,NaN\n0.3,3\n', 'not a number', 3],
    ['text in a number column', 'Time (min),Signal\n0.1,1\n0.2,2\n0.3,over\n0.4,4\n', 'not a number', 4],
    ['a number with text behind it', 'Time (min),Signal\n0.1,1\n0.2,2\n0.3,3x\n0.4,4\n', 'not a number', 4],
    ['an empty cell', 'Time (min),Signal\n0.1,1\n0.2,\n0.3,3\n', 'not a number', 3],
    ['a missing cell', 'Time (min),Signal\n0.1,1\n0.2\n0.3,3\n', 'not a number', 3],
    ['times out of order', 'Time (min),Signal\n0.1,1\n0.3,2\n0.2,3\n0.4,3\n', 'unsorted times', 4],
    ['a repeated time', 'Time (min),Signal\n0.1,1\n0.2,2\n0.2,3\n', 'repeated time', 4],
    ['an index instead of times', '1,5\n2,6\n3,7\n4,8\n', 'no time axis', 1],
    ['a single point', 'Time (min),Signal\n0.1,1\n', 'too few points', null],
    ['binary', '\u0001\u0000\u0002\u0000\u0000\u0007', 'not text', null],
  ])('is refused: %s', (_, text, code, line) => {
    expect(refusal(text)).toMatchObject({ code, line });
  });

  it('is refused when a column is asked for that is not there, naming those that are', () => {
    const problem = refusal('Time (min),Signal\n0.1,1\n0.2,2\n', { signalColumn: 'TCD' });
    expect(problem).toMatchObject({ code: 'no such column' });
    expect(problem.message).toContain('Time (min), Signal');
  });

  it('counts lines in the file, blank ones and comments included', () => {
    expect(refusal('# made up\n\nTime (min),Signal\n0.1,1\n\n0.2,2\n# x\n0.3,?\n0.4,1\n').line).toBe(8);
  });

  it('never throws, whatever the bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 300 }), (bytes) => {
        const result = readCsvTrace(bytes);
        expect(result.ok ? result.timeMin.length : result.problem.message.length).toBeGreaterThan(0);
      }),
    );
  });
});

describe('the number scanner', () => {
  it('gives the same bits as the language itself', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const scanned = { value: 0, end: 0 };
        const text = String(value);
        scanNumber(bytesOf(text), 0, text.length, 0x2e, scanned);
        expect(Object.is(scanned.value, value) || scanned.value === Number(text)).toBe(true);
        expect(scanned.end).toBe(text.length);
      }),
      { numRuns: 2000 },
    );
    fc.assert(
      fc.property(
        fc.integer({ min: -999_999_999, max: 999_999_999 }),
        fc.integer({ min: 0, max: 8 }),
        (whole, places) => {
          const text = (whole / 10 ** places).toFixed(places);
          const scanned = { value: 0, end: 0 };
          scanNumber(bytesOf(text), 0, text.length, 0x2e, scanned);
          expect(scanned.value === Number(text)).toBe(true);
        },
      ),
    );
  });
});

describe('a real run of a gas chromatograph', () => {
  // Index and signal of one GC-FID run; data set of the R package ptw (GPL), not copied here.
  const path = '../shared/samples/gc-fid.csv';

  it('is refused without a time axis and read with a sampling rate, when the file is at hand', () => {
    if (!existsSync(path)) {
      process.stdout.write(`${path} is not here: the real run was not read\n`);
      expect(existsSync(path)).toBe(false);
      return;
    }
    const bytes = readFileSync(path);
    expect(refusal(bytes)).toMatchObject({ code: 'no time axis' });
    const { timeMin, signal } = read(bytes, { samplingHz: 2 });
    expect(timeMin.length).toBe(5000);
    expect(Math.max(...signal)).toBe(709.61);
    const result = integrate({ timeMin, signal });
    const share = result.peaks.reduce((sum, peak) => sum + peak.areaPercent, 0);
    expect(share).toBeCloseTo(100, 9);
    const tallest = result.peaks.reduce((best, peak) => (peak.height > best.height ? peak : best));
    expect(tallest.height).toBeGreaterThan(690);
    expect(result.noise.quantisationStep).toBeCloseTo(1, 1);
    process.stdout.write(
      `real run: ${result.peaks.length} peaks, largest ${tallest.areaPercent.toFixed(2)} %, noise h ${result.noise.peakToPeak.toFixed(2)}\n`,
    );
  });
});

it('quotes the one cell whose number is too large, in either column', () => {
  const inSignal = refusal('time (min),signal\n0,1\n0.1,1e999\n0.2,3\n0.3,4\n');
  expect(inSignal).toMatchObject({ code: 'not a number', line: 3 });
  expect(inSignal.message).toContain('Line 3, column 2: "1e999" is not a number.');
  const inTime = refusal('time (min),signal\n0,1\n0.1,2\n1e999,3\n');
  expect(inTime.message).toContain('Line 4, column 1: "1e999" is not a number.');
});
