import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { parseArgs } from 'node:util';
import { Bench } from './bench';
import type { BenchRow, Figure } from './bench-row';
import { describeMachine } from './machine';
import { formatTable } from './table';

/** Every file of rows/ is a row. */
async function loadRows(): Promise<BenchRow[]> {
  const folder = join(import.meta.dirname, 'rows');
  const files = readdirSync(folder)
    .filter((file) => file.endsWith('.ts'))
    .sort();
  const modules = await Promise.all(files.map((file) => import(pathToFileURL(join(folder, file)).href)));
  return modules.map((module: { row: BenchRow }) => module.row);
}

function chooseRows(rows: BenchRow[], only: string[] | undefined): BenchRow[] {
  const names = rows.map((row) => row.name);
  const unknown = only?.find((name) => !names.includes(name));
  if (unknown !== undefined) throw new Error(`There is no row "${unknown}". There are: ${names.join(', ')}.`);
  return only ? rows.filter((row) => only.includes(row.name)) : rows;
}

/** Measures the rows one after the other and prints them; 1 when a row could not be measured, else 0. */
async function runBench(): Promise<number> {
  const { values } = parseArgs({ options: { only: { type: 'string', multiple: true } } });
  const rows = chooseRows(await loadRows(), values.only);
  const started = performance.now();
  const bench = new Bench();
  // The browser's library listens for these too, and would let this process live on.
  for (const signal of ['SIGINT', 'SIGTERM'] as const)
    process.once(signal, () => void bench.close().finally(() => process.exit(1)));
  const figures: Figure[] = [];
  let code = 0;
  try {
    console.log(`\n${await describeMachine(await bench.database())}\n`);
    for (const row of rows) {
      const before = performance.now();
      try {
        figures.push(...(await row.measure(bench)));
      } catch (error) {
        code = 1;
        const note = error instanceof Error ? error.message : String(error);
        figures.push({ what: row.name, measured: 'failed', baseline: '', ratio: null, note });
      }
      console.log(`${row.name}: ${((performance.now() - before) / 1000).toFixed(1)} s`);
    }
  } finally {
    await bench.close();
  }
  console.log(`\n${formatTable(figures)}\n`);
  console.log(
    `Measured in ${((performance.now() - started) / 1000).toFixed(0)} s. Goals are aims, not limits.`,
  );
  return code;
}

process.exit(
  await runBench().catch((error: unknown) => {
    console.error(error instanceof Error ? error.message : error);
    return 1;
  }),
);
