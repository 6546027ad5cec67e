export type Delimiter = ',' | ';' | 'tab' | 'space' | '|';
export type DecimalMark = '.' | ',';

export interface CsvLayout {
  delimiter: Delimiter;
  decimal: DecimalMark;
  /** Lines before the first line of numbers, comments and blank lines included. */
  headerLines: number;
  /** Names of the columns: the heading's own, else "column 1" and so on. */
  columns: string[];
  /** All lines before the numbers, for units and hints. */
  headerText: string;
  /** Byte at which the first line of numbers begins. */
  dataStart: number;
  named: boolean;
}

const separators: Record<Delimiter, RegExp> = {
  ',': /,/,
  ';': /;/,
  tab: /\t/,
  space: /\s+/,
  '|': /\|/,
};
const plainNumber = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;
const commaNumber = /^[+-]?(\d+,?\d*|,\d+)([eE][+-]?\d+)?$/;

function unquoted(cell: string): string {
  const trimmed = cell.trim();
  return trimmed.length >= 2 && /^["'].*["']$/.test(trimmed) ? trimmed.slice(1, -1).trim() : trimmed;
}

/** Cells of a line; a delimiter at the very end makes no further cell. */
export function splitCells(line: string, delimiter: Delimiter): string[] {
  const cells = (delimiter === 'space' ? line.trim() : line).split(separators[delimiter]).map(unquoted);
  while (cells.length > 1 && cells[cells.length - 1] === '') cells.pop();
  return cells;
}

function numericCells(line: string, delimiter: Delimiter, decimal: DecimalMark): number {
  const pattern = decimal === ',' ? commaNumber : plainNumber;
  const cells = splitCells(line, delimiter);
  return cells.every((cell) => cell === '' || pattern.test(cell) || /^(nan|inf|n\/a|-)$/i.test(cell))
    ? cells.filter((cell) => pattern.test(cell)).length
    : 0;
}

function isComment(line: string): boolean {
  return /^\s*[#%!/]/.test(line);
}

interface Guess {
  delimiter: Delimiter;
  decimal: DecimalMark;
  score: number;
}

/** Tries the usual delimiters with both decimal marks; the one under which most lines are rows of equally many numbers wins. */
function guessSeparators(lines: string[], fixed: { delimiter?: Delimiter; decimal?: DecimalMark }): Guess {
  const delimiters: Delimiter[] = fixed.delimiter ? [fixed.delimiter] : ['tab', ';', ',', '|', 'space'];
  const marks: DecimalMark[] = fixed.decimal ? [fixed.decimal] : ['.', ','];
  let best: Guess = { delimiter: delimiters[0]!, decimal: marks[0]!, score: -1 };
  for (const delimiter of delimiters) {
    for (const decimal of marks) {
      if (delimiter === ',' && decimal === ',') continue;
      const counts = lines.map((line) => numericCells(line, delimiter, decimal));
      const tally = new Map<number, number>();
      for (const count of counts) if (count > 0) tally.set(count, (tally.get(count) ?? 0) + 1);
      for (const [columns, rows] of tally) {
        // Two columns and more beat one; beyond that the number of good rows decides.
        const score = rows * (columns >= 2 ? 1000 : 1);
        if (score > best.score) best = { delimiter, decimal, score };
      }
    }
  }
  return best;
}

/**
 * Finds out how a table is written from its first lines. `lines` are the first of the file, without line ends, `starts` the
 * bytes at which they begin. Null when no line holds a number.
 */
export function detectLayout(
  lines: string[],
  starts: number[],
  fixed: { delimiter?: Delimiter; decimal?: DecimalMark },
): CsvLayout | null {
  const body = lines.filter((line) => line.trim() !== '' && !isComment(line));
  const { delimiter, decimal, score } = guessSeparators(body, fixed);
  if (score <= 0) return null;
  const counts = lines.map((line) => (isComment(line) ? 0 : numericCells(line, delimiter, decimal)));
  const most = [...counts].sort((a, b) => b - a)[0]!;
  const usual = most >= 2 ? 2 : 1;
  const content = lines.map((_, k) => k).filter((k) => lines[k]!.trim() !== '' && !isComment(lines[k]!));
  // A line of numbers whose followers are mostly words still belongs to the heading.
  const starting = content.findIndex((k, place) => {
    const followers = content.slice(place + 1, place + 6);
    return (
      counts[k]! >= usual && 2 * followers.filter((next) => counts[next]! > 0).length >= followers.length
    );
  });
  const first = starting >= 0 ? content[starting]! : counts.findIndex((count) => count >= usual);
  const width = splitCells(lines[first]!, delimiter).length;
  const heading = lines
    .slice(0, first)
    .map((line) => splitCells(line.replace(/^\s*[#%!/]+/, ''), delimiter))
    .filter((cells) => cells.length === width && cells.every((cell) => cell !== ''));
  const names = heading[heading.length - 1];
  return {
    delimiter,
    decimal,
    headerLines: first,
    columns: names ?? Array.from({ length: width }, (_, k) => `column ${k + 1}`),
    headerText: lines.slice(0, first).join('\n'),
    dataStart: starts[first]!,
    named: names !== undefined,
  };
}
