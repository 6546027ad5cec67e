import Link from 'next/link';
import type { ReactNode } from 'react';
import { StateMark } from '@/components/states/state-mark';
import { type Column, DataTable } from '@/components/ui/data-table';
import type { Waiting } from '@/lib/acceptance/queue-schema';

const columns: Column<Waiting>[] = [
  {
    key: 'code',
    header: 'Fraction',
    rowHeader: true,
    cell: (row) => (
      <Link href={`/fractions/${row.code}`} className="link whitespace-nowrap">
        {row.code}
      </Link>
    ),
  },
  { key: 'compound', header: 'Compound', cell: (row) => row.compound },
  { key: 'cut', header: 'Cut', cell: (row) => <StateMark state={row.cut} size="sm" look="plain" /> },
  { key: 'verdict', header: 'Verdict', cell: (row) => <StateMark state={row.verdictState} size="sm" /> },
  {
    key: 'purity',
    header: 'GC area',
    numeric: true,
    cell: (row) => (row.purityPercent === null ? 'not known' : `${row.purityPercent.toFixed(2)} %`),
  },
  {
    key: 'what',
    header: 'What is open',
    className: 'max-w-prose',
    cell: (row) => (
      <span className="block text-left">
        {row.status === 'returned' && row.reason ? (
          <span className="block font-bold">{row.reason}</span>
        ) : null}
        {row.summary ?? 'Not judged yet: open it.'}
      </span>
    ),
  },
  {
    key: 'by',
    header: 'Collected by',
    cell: (row) => (
      <>
        <span className="whitespace-nowrap">{row.collectedBy}</span>
        {row.mine ? <span className="block text-sm text-ink-soft">you</span> : null}
      </>
    ),
  },
  {
    key: 'since',
    header: 'Since',
    cell: (row) => <span className="whitespace-nowrap">{row.since.slice(0, 10)}</span>,
  },
];

/** Fractions that wait, with what is open about each. */
export function WaitingTable({
  caption,
  rows,
  empty,
}: {
  caption: string;
  rows: Waiting[];
  empty?: ReactNode;
}) {
  return (
    <DataTable caption={caption} columns={columns} rows={rows} rowKey={(row) => row.code} empty={empty} />
  );
}
