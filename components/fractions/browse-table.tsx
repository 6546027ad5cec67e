import Link from 'next/link';
import { LocalTime } from '@/components/runs/local-time';
import { StateMark } from '@/components/states/state-mark';
import { type Column, DataTable } from '@/components/ui/data-table';
import type { FractionRow, FractionSort } from '@/lib/distillation/fraction-schema';
import { formatMass } from '@/lib/units/mass';

type BrowseTableProps = {
  rows: readonly FractionRow[];
  sort: FractionSort;
  severalGroups: boolean;
};

/** Fractions as a table, as cards on a phone. */
export function BrowseTable({ rows, sort, severalGroups }: BrowseTableProps) {
  const columns: Column<FractionRow>[] = [
    {
      key: 'code',
      header: 'Fraction',
      rowHeader: true,
      sorted: sort === 'code' ? 'ascending' : undefined,
      cell: (row) => (
        <Link className="link" href={`/fractions/${row.code}`}>
          {row.code}
        </Link>
      ),
    },
    { key: 'compound', header: 'Compound', cell: (row) => row.compound.name },
    { key: 'cut', header: 'Cut', cell: (row) => <StateMark state={row.cut} look="plain" /> },
    {
      key: 'net',
      header: 'Net mass',
      numeric: true,
      cell: (row) => (row.netMassG === null ? 'not weighed' : formatMass(row.netMassG)),
    },
    {
      key: 'purity',
      header: 'GC area',
      numeric: true,
      sorted: sort === '-purity' ? 'descending' : undefined,
      cell: (row) => (row.purityPercent === null ? 'not known' : `${row.purityPercent.toFixed(2)} %`),
    },
    { key: 'verdict', header: 'Verdict', cell: (row) => <StateMark state={row.verdict} look="plain" /> },
    { key: 'status', header: 'Status', cell: (row) => <StateMark state={row.status} look="plain" /> },
    {
      key: 'collected',
      header: 'Collected',
      sorted: sort === '-collectedAt' ? 'descending' : undefined,
      cell: (row) => <LocalTime at={row.collectedAt} dateOnly />,
    },
    { key: 'by', header: 'By', cell: (row) => row.collectedBy },
    ...(severalGroups ? [{ key: 'group', header: 'Group', cell: (row: FractionRow) => row.group.name }] : []),
  ];
  return (
    <DataTable caption="Fractions" captionHidden columns={columns} rows={rows} rowKey={(row) => row.id} />
  );
}
