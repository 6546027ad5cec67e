import type { Figure } from './bench-row';

const headings = ['what ÷ baseline', 'measured', 'baseline', 'ratio', 'from – to', 'goal'];

function ratioText(ratio: number): string {
  return ratio < 10 ? ratio.toFixed(2) : ratio.toFixed(1);
}

function cellsOf(figure: Figure): string[] {
  return [
    figure.what,
    figure.measured,
    figure.baseline,
    figure.ratio === null ? '-' : ratioText(figure.ratio),
    figure.spread ? figure.spread.map(ratioText).join(' – ') : '',
    figure.goal ?? '',
  ];
}

/** The figures as lines of a table for a terminal, with numbered notes under it. */
export function formatTable(figures: readonly Figure[]): string {
  const notes: string[] = [];
  const rows = figures.map((figure) => {
    const cells = cellsOf(figure);
    if (figure.note) {
      if (!notes.includes(figure.note)) notes.push(figure.note);
      cells[0] += ` [${notes.indexOf(figure.note) + 1}]`;
    }
    return cells;
  });
  const widths = headings.map((heading, column) =>
    Math.max(heading.length, ...rows.map((cells) => cells[column]!.length)),
  );
  const line = (cells: string[]) =>
    cells
      .map((cell, column) =>
        column === 0 || column === 5 ? cell.padEnd(widths[column]!) : cell.padStart(widths[column]!),
      )
      .join('  ')
      .trimEnd();
  return [
    line(headings),
    widths.map((width) => '-'.repeat(width)).join('  '),
    ...rows.map(line),
    ...notes.map((note, index) => `${index === 0 ? '\n' : ''}[${index + 1}] ${note}`),
  ].join('\n');
}
