import Link from 'next/link';
import { SmallChromatogram } from '@/components/charts/small-chromatogram';
import { DataTable } from '@/components/ui/data-table';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';
import type { SmallTrace } from '@/components/charts/small-chromatogram-layout';
import { SheetPeakSticks } from './sheet-peak-sticks';

type Trace = FractionSheet['traces'][number];

const columns = [
  { key: 'number', header: 'Peak', rowHeader: true, cell: (peak: Peak) => peak.number },
  { key: 'time', header: 'Time, min', numeric: true, cell: (peak: Peak) => peak.retentionTimeMin.toFixed(2) },
  { key: 'area', header: 'Area %', numeric: true, cell: (peak: Peak) => peak.areaPercent.toFixed(2) },
  {
    key: 'noise',
    header: 'S/N',
    numeric: true,
    cell: (peak: Peak) => (peak.signalToNoise === null ? 'not known' : peak.signalToNoise.toFixed(0)),
  },
  { key: 'compound', header: 'Assigned to', cell: (peak: Peak) => peak.compound ?? 'not assigned' },
];
type SheetTracesProps = {
  traces: Trace[];
  /** By the trace's id. */
  pictures: Readonly<Record<string, SmallTrace>>;
  linked?: boolean;
};
type Peak = NonNullable<Trace['integration']>['peaks'][number];

/**
 * Gas chromatograms of the fraction with the largest peaks of the integration in force. A trace without a picture (its
 * file cannot be read at the moment) is shown by its kept peaks, as sticks.
 */
export function SheetTraces({ traces, pictures, linked = true }: SheetTracesProps) {
  if (traces.length === 0) return <p className="text-ink-soft">No gas chromatogram of this fraction yet.</p>;
  return (
    <ul className="grid grid-cols-1 gap-4">
      {traces.map((trace) => {
        const title = `GC, ${trace.detector}`;
        const { integration } = trace;
        const picture = pictures[trace.id];
        const shown = [...(integration?.peaks ?? [])]
          .sort((a, b) => b.areaPercent - a.areaPercent)
          .slice(0, 6)
          .sort((a, b) => a.number - b.number);
        return (
          <li key={trace.id} className="min-w-0 rounded border border-line bg-paper-raised p-3">
            <h3 className="font-bold">
              {linked ? (
                <Link href={`/traces/${trace.id}`} className="link inline-flex min-h-target items-center">
                  {title}
                </Link>
              ) : (
                title
              )}
            </h3>
            {picture ? (
              <SmallChromatogram trace={picture} peaks={integration?.peaks ?? []} />
            ) : (
              <>
                <p className="text-sm text-ink-soft">
                  The file cannot be drawn at the moment; these are the kept peaks.
                </p>
                <SheetPeakSticks trace={trace} />
              </>
            )}
            {integration ? (
              <>
                <p className="mb-2 text-sm text-ink-soft">
                  Integration {integration.number} of {trace.integrations}, by {integration.author}
                  {integration.reason ? `: ${integration.reason}` : ''}
                </p>
                <DataTable
                  caption={`Largest peaks of ${integration.peaks.length}`}
                  columns={columns}
                  rows={shown}
                  rowKey={(peak) => String(peak.number)}
                />
              </>
            ) : (
              <p className="text-ink-soft">Not integrated yet.</p>
            )}
          </li>
        );
      })}
    </ul>
  );
}
