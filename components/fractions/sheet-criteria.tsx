import { StateMark } from '@/components/states/state-mark';
import { type Column, DataTable } from '@/components/ui/data-table';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';

type Criterion = FractionSheet['verdict']['criteria'][number];

const columns: Column<Criterion>[] = [
  { key: 'name', header: 'Criterion', rowHeader: true, cell: (row) => row.name },
  { key: 'state', header: 'State', cell: (row) => <StateMark state={row.state} size="sm" /> },
  {
    key: 'measured',
    header: 'Measured',
    cell: (row) => (
      <>
        {row.measured ?? 'nothing'}
        {row.uncertainty ? <span className="block text-sm text-ink-soft">{row.uncertainty}</span> : null}
      </>
    ),
  },
  { key: 'limit', header: 'Limit', cell: (row) => row.limit ?? '' },
  {
    key: 'reason',
    header: 'Why',
    className: 'max-w-prose',
    cell: (row) => (
      <span className="block text-left">
        {row.reason}
        <span className="block text-sm text-ink-soft">{row.source}</span>
      </span>
    ),
  },
];

/** Every criterion with what was measured, its limit, its uncertainty, why, and on what grounds. */
export function SheetCriteria({ verdict }: { verdict: FractionSheet['verdict'] }) {
  const { specification } = verdict;
  return (
    <DataTable
      caption={
        specification
          ? `By ${specification.grade}, edition ${specification.edition}, ${specification.decisionRule} acceptance. U at k = 2.`
          : 'No specification'
      }
      columns={columns}
      rows={verdict.criteria}
      rowKey={(row) => row.name}
      empty={<p className="text-ink-soft">{verdict.summary}</p>}
    />
  );
}
