import { readFile } from 'node:fs/promises';
import { isPeroxideClass, type PeroxideClass } from '@/lib/compounds/hazards';
import { isLiteratureProperty, type LiteratureProperty } from '@/lib/compounds/property-names';

export interface ReferenceCompound {
  name: string;
  cas: string;
  formula: string;
  molarMassGMol: number;
  smiles: string;
  inchikey: string | null;
  smilesSource: string;
  peroxideClass: PeroxideClass | null;
  synonyms: string[];
}

export interface ReferenceLiteratureValue {
  cas: string;
  property: LiteratureProperty;
  /** Exactly one of value and coefficients is set. */
  value: number | null;
  /** The value as it was published, so that no digit is lost or added. */
  valueText: string | null;
  coefficients: Record<string, number> | null;
  unit: string;
  temperatureC: number | null;
  pressureKPa: number | null;
  wavelengthNm: number | null;
  rangeMinC: number | null;
  rangeMaxC: number | null;
  source: string;
  preferred: boolean;
  note: string | null;
}

type Row = (column: string) => string;

/** Rows of a tab-separated text with a header, each as a function from column name to cell. */
function parseTable<T>(text: string, columns: readonly string[], build: (cell: Row) => T): T[] {
  const [header = '', ...lines] = text.replace(/\r/g, '').replace(/\n+$/, '').split('\n');
  const names = header.split('\t');
  const missing = columns.filter((column) => !names.includes(column));
  if (missing.length > 0) throw new Error(`The table has no column ${missing.join(', ')}.`);
  return lines.map((line, index) => {
    const cells = line.split('\t');
    if (cells.length !== names.length)
      throw new Error(`Line ${index + 2} has ${cells.length} cells, the header has ${names.length}.`);
    try {
      return build((column) => cells[names.indexOf(column)] ?? '');
    } catch (error) {
      throw new Error(`Line ${index + 2}: ${error instanceof Error ? error.message : 'cannot be read'}`);
    }
  });
}

function numberOrNull(cell: string): number | null {
  if (cell === '') return null;
  const value = Number(cell);
  if (!Number.isFinite(value)) throw new Error(`${cell} is not a number.`);
  return value;
}

function requireNumber(cell: string): number {
  const value = numberOrNull(cell);
  if (value === null) throw new Error('A number is missing.');
  return value;
}

function parseCoefficients(cell: string): Record<string, number> | null {
  if (cell === '') return null;
  const parsed: unknown = JSON.parse(cell);
  if (
    typeof parsed !== 'object' ||
    parsed === null ||
    Object.values(parsed).some((value) => typeof value !== 'number')
  )
    throw new Error('Coefficients are a JSON object of numbers.');
  return parsed as Record<string, number>;
}

/** Reads the text of `compounds.tsv`. @throws Error that names the line. */
export function parseReferenceCompounds(text: string): ReferenceCompound[] {
  const columns = [
    'name',
    'cas',
    'formula',
    'molarMassGMol',
    'smiles',
    'inchikey',
    'smilesSource',
    'peroxideClass',
    'synonyms',
  ];
  return parseTable(text, columns, (cell) => {
    const peroxideClass = cell('peroxideClass');
    if (peroxideClass !== '' && !isPeroxideClass(peroxideClass))
      throw new Error(`${peroxideClass} is not a peroxide class.`);
    return {
      name: cell('name'),
      cas: cell('cas'),
      formula: cell('formula'),
      molarMassGMol: requireNumber(cell('molarMassGMol')),
      smiles: cell('smiles'),
      inchikey: cell('inchikey') || null,
      smilesSource: cell('smilesSource'),
      peroxideClass: isPeroxideClass(peroxideClass) ? peroxideClass : null,
      synonyms: cell('synonyms')
        .split(';')
        .filter((synonym) => synonym !== ''),
    };
  });
}

/** Reads the text of `literature-values.tsv`. @throws Error that names the line. */
export function parseReferenceLiteratureValues(text: string): ReferenceLiteratureValue[] {
  const columns = [
    'cas',
    'property',
    'value',
    'coefficients',
    'unit',
    'temperatureC',
    'pressureKPa',
    'wavelengthNm',
  ];
  return parseTable(text, [...columns, 'rangeMinC', 'rangeMaxC', 'source', 'preferred', 'note'], (cell) => {
    const property = cell('property');
    if (!isLiteratureProperty(property)) throw new Error(`${property} is not a literature property.`);
    const value = numberOrNull(cell('value'));
    const coefficients = parseCoefficients(cell('coefficients'));
    if ((value === null) === (coefficients === null))
      throw new Error('Give a value or coefficients, and not both.');
    return {
      cas: cell('cas'),
      property,
      value,
      valueText: cell('value') || null,
      coefficients,
      unit: cell('unit'),
      temperatureC: numberOrNull(cell('temperatureC')),
      pressureKPa: numberOrNull(cell('pressureKPa')),
      wavelengthNm: numberOrNull(cell('wavelengthNm')),
      rangeMinC: numberOrNull(cell('rangeMinC')),
      rangeMaxC: numberOrNull(cell('rangeMaxC')),
      source: cell('source'),
      preferred: cell('preferred') === '1',
      note: cell('note') || null,
    };
  });
}

/** The compounds of the reference table, in its order. */
export async function readReferenceCompounds(): Promise<ReferenceCompound[]> {
  return parseReferenceCompounds(await readFile(new URL('./compounds.tsv', import.meta.url), 'utf8'));
}

/** The literature values of the reference table, grouped by compound in the order of the compounds. */
export async function readReferenceLiteratureValues(): Promise<ReferenceLiteratureValue[]> {
  return parseReferenceLiteratureValues(
    await readFile(new URL('./literature-values.tsv', import.meta.url), 'utf8'),
  );
}
