import Link from 'next/link';
import { type Column, DataTable } from '@/components/ui/data-table';
import type { RunRow } from '@/lib/distillation/schema';
import { formatMass } from '@/lib/units/mass';
import { LocalTime } from './local-time';

const columns: Column<RunRow>[] = [
  {
    key: 'code',
    header: 'Run',
    rowHeader: true,
    cell: (run) => (
      <Link className="link" href={`/runs/${run.code}`}>
        {run.code}
      </Link>
    ),
  },
  { key: 'target', header: 'Target', cell: (run) => run.targetCompound.name },
  { key: 'technique', header: 'Technique', cell: (run) => run.technique },
  { key: 'charge', header: 'Charge', numeric: true, cell: (run) => formatMass(run.chargeMassG, 'g', 1) },
  {
    key: 'fractions',
    header: 'Fractions',
    cell: (run) =>
      run.fractionCount === 0 ? 'none yet' : `${run.fractionCount}, ${run.signedOffCount} signed off`,
  },
  { key: 'started', header: 'Started', cell: (run) => <LocalTime at={run.startedAt} dateOnly /> },
  {
    key: 'ended',
    header: 'Ended',
    cell: (run) => (run.endedAt ? <LocalTime at={run.endedAt} dateOnly /> : 'still running'),
  },
  { key: 'chemist', header: 'Chemist', cell: (run) => run.chemist },
];

/** Runs as a table, as cards on a phone. */
export function RunsTable({ runs }: { runs: readonly RunRow[] }) {
  return (
    <DataTable
      caption="Runs, the latest first"
      captionHidden
      columns={columns}
      rows={runs}
      rowKey={(run) => run.id}
    />
  );
}
