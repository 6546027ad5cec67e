'use client';
import { DataTable } from '@/components/ui/data-table';
import type { PeakJson } from '@/lib/evidence/gc/schema';
import { AssignPeak } from './assign-peak';

type PeakTableProps = {
  id: string;
  peaks: readonly PeakJson[];
  selectedPeak: number | null;
  onSelectPeak: (number: number | null) => void;
  /** Null: an older version is looked at, whose peaks cannot be assigned. */
  assign: { traceId: string; disabledReason: string | null; onDone: () => void } | null;
};

const figure = (value: number | null, digits: number) =>
  value === null ? 'not measured' : value.toFixed(digits);

/** Areas span many powers of ten: four significant figures, never an exponent for the usual ones. */
function areaText(area: number): string {
  return Math.abs(area) >= 0.001 && Math.abs(area) < 1e6
    ? String(Number(area.toPrecision(4)))
    : area.toExponential(3);
}

/** The peaks in numbers. Choosing one marks it in the picture, and the other way round. */
export function PeakTable({ id, peaks, selectedPeak, onSelectPeak, assign }: PeakTableProps) {
  return (
    <div id={id} tabIndex={-1} className="overflow-x-auto">
      <DataTable
        caption="Figures as USP <621> and Ph. Eur. 2.2.46 define them; S/N 3 detects, 10 quantifies."
        columns={[
          {
            key: 'number',
            header: 'Peak',
            rowHeader: true,
            cell: (peak: PeakJson) => (
              <button
                type="button"
                aria-pressed={peak.number === selectedPeak}
                onClick={() => onSelectPeak(peak.number === selectedPeak ? null : peak.number)}
                className={
                  'min-h-target min-w-target rounded border px-3 font-bold ' +
                  (peak.number === selectedPeak
                    ? 'border-glass bg-glass text-glass-on'
                    : 'border-line-strong bg-paper-raised hover:border-glass')
                }
              >
                {peak.number}
                <span className="sr-only">, mark in the picture</span>
              </button>
            ),
          },
          {
            key: 'time',
            header: 'Time, min',
            numeric: true,
            cell: (peak) => peak.retentionTimeMin.toFixed(3),
          },
          { key: 'percent', header: 'Area, %', numeric: true, cell: (peak) => peak.areaPercent.toFixed(3) },
          { key: 'area', header: 'Area', numeric: true, cell: (peak) => areaText(peak.area) },
          { key: 'noise', header: 'S/N', numeric: true, cell: (peak) => figure(peak.signalToNoise, 0) },
          { key: 'resolution', header: 'Rs', numeric: true, cell: (peak) => figure(peak.resolution, 1) },
          { key: 'tailing', header: 'As', numeric: true, cell: (peak) => figure(peak.tailing, 2) },
          { key: 'plates', header: 'N', numeric: true, cell: (peak) => figure(peak.plates, 0) },
          { key: 'flags', header: 'Remarks', cell: (peak) => peak.flags.join('; ') || 'none' },
          {
            key: 'compound',
            header: 'Compound',
            cell: (peak) => (
              <span className="inline-flex flex-wrap items-center gap-2 max-sm:justify-end">
                {peak.compound?.name ?? <span className="text-ink-soft">not assigned</span>}
                {assign ? <AssignPeak peak={peak} {...assign} /> : null}
              </span>
            ),
          },
        ]}
        rows={peaks}
        rowKey={(peak) => String(peak.number)}
        currentKey={selectedPeak === null ? undefined : String(selectedPeak)}
        empty={
          <p className="text-ink-soft">
            No peak was found. Look at the trace, then lower the smallest S/N or the smallest area and
            integrate again.
          </p>
        }
      />
    </div>
  );
}
