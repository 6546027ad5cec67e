import { StateMark } from '@/components/states/state-mark';
import { type Column, DataTable } from '@/components/ui/data-table';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';

type Row = FractionSheet['coverage'][number];

function CoverageCell({ row, test }: { row: Row; test: string }) {
  const cell = row.tests.find((one) => one.test === test);
  if (!cell) return <StateMark state="not done" size="sm" look="plain" />;
  const limit =
    cell.state === 'sees' && cell.limitPercent !== undefined
      ? `down to ${cell.limitPercent.toPrecision(2)} %`
      : undefined;
  return (
    <details className="group max-sm:text-right">
      <summary className="inline-flex min-h-target cursor-pointer list-none flex-wrap items-center gap-x-2 max-sm:justify-end">
        <StateMark state={cell.state} size="sm" look="plain" detail={limit} />
        <span className="text-sm text-ink-soft underline group-open:hidden">why</span>
      </summary>
      <p className="max-w-60 text-sm whitespace-normal">{cell.reason}</p>
    </details>
  );
}

/** Known impurities and water against the tests: what each sees, what it is blind to, and what closes a hole. */
export function SheetCoverage({ coverage }: { coverage: Row[] }) {
  const tests = [...new Set(coverage.flatMap((row) => row.tests.map((cell) => cell.test)))];
  const columns: Column<Row>[] = [
    {
      key: 'compound',
      header: 'Impurity',
      rowHeader: true,
      cell: (row) => (
        <>
          {row.compound}
          {row.decides ? null : (
            <span className="block text-sm font-normal text-ink-soft">not a known impurity here</span>
          )}
        </>
      ),
    },
    {
      key: 'seen',
      header: 'By any test',
      cell: (row) =>
        row.seen ? <StateMark state="sees" size="sm" /> : <StateMark state="blind" size="sm" />,
    },
    ...tests.map((test) => ({
      key: test,
      header: test,
      cell: (row: Row) => <CoverageCell row={row} test={test} />,
    })),
  ];
  const holes = coverage.filter((row) => row.advice);
  return (
    <>
      <DataTable
        caption="What each test that was done can see, computed from structure, literature values, detector and noise"
        columns={columns}
        rows={coverage}
        rowKey={(row) => row.compound}
      />
      {holes.length > 0 ? (
        <ul className="mt-2 flex flex-col gap-1">
          {holes.map((row) => (
            <li key={row.compound}>{row.advice}</li>
          ))}
        </ul>
      ) : null}
    </>
  );
}
