'use client';
import Link from 'next/link';
import { formatHeadRange } from '@/components/charts/cut-strip-table';
import { StateMark } from '@/components/states/state-mark';
import { buttonClass } from '@/components/ui/button-class';
import { type Column, DataTable } from '@/components/ui/data-table';
import type { FractionJson } from '@/lib/distillation/fraction-schema';
import { formatMass } from '@/lib/units/mass';
import { formatPressure } from '@/lib/units/pressure';
import { usePressureUnit } from './use-pressure-unit';

/** The receivers of one run. "Weigh or correct" leads to the facts, the code to the evidence. */
export function FractionsTable({
  fractions,
  mayChange,
}: {
  fractions: readonly FractionJson[];
  mayChange: boolean;
}) {
  const [unit] = usePressureUnit();
  const columns: Column<FractionJson>[] = [
    {
      key: 'code',
      header: 'Fraction',
      rowHeader: true,
      cell: (fraction) => (
        <Link className="link" href={`/fractions/${fraction.code}`}>
          {fraction.code}
        </Link>
      ),
    },
    { key: 'cut', header: 'Cut', cell: (fraction) => <StateMark state={fraction.cut} look="plain" /> },
    {
      key: 'net',
      header: 'Net mass',
      numeric: true,
      cell: (f) => (f.netMassG === null ? 'not weighed' : formatMass(f.netMassG)),
    },
    { key: 'head', header: 'Head temperature', cell: (fraction) => formatHeadRange(fraction) },
    {
      key: 'pressure',
      header: 'Pressure',
      numeric: true,
      cell: (f) => (f.pressureMbar === null ? 'not recorded' : formatPressure(f.pressureMbar, unit)),
    },
    {
      key: 'purity',
      header: 'GC area',
      numeric: true,
      cell: (f) => (f.purityPercent === null ? 'not known' : `${f.purityPercent.toFixed(2)} %`),
    },
    {
      key: 'status',
      header: 'Status',
      cell: (fraction) => <StateMark state={fraction.status} look="plain" />,
    },
    {
      key: 'verdict',
      header: 'Verdict',
      cell: (fraction) => <StateMark state={fraction.verdict} look="plain" />,
    },
    ...(mayChange
      ? [
          {
            key: 'change',
            header: 'Facts',
            cell: (fraction: FractionJson) => (
              <Link
                className={buttonClass('quiet')}
                href={`/runs/${fraction.run}/fractions/${fraction.number}`}
              >
                {fraction.netMassG === null ? 'Weigh' : 'Correct'}
                <span className="sr-only"> {fraction.code}</span>
              </Link>
            ),
          },
        ]
      : []),
  ];
  return (
    <DataTable
      caption="Fractions of this run"
      captionHidden
      columns={columns}
      rows={fractions}
      rowKey={(fraction) => fraction.id}
    />
  );
}
