import Link from 'next/link';
import { SmallChromatogram } from '@/components/charts/small-chromatogram';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';
import type { SmallTrace } from '@/components/charts/small-chromatogram-layout';
import { SheetPeakSticks } from './sheet-peak-sticks';

type Trace = FractionSheet['traces'][number];

type Peak = NonNullable<Trace['integration']>['peaks'][number];

/** The largest peaks, narrow enough to stay a table on a phone. */
function PeakTable({ peaks, of }: { peaks: Peak[]; of: number }) {
  const head = 'border-b border-line-strong py-1 text-sm font-bold text-ink-soft';
  return (
    <table className="w-full border-collapse">
      <caption className="pb-1 text-left text-sm text-ink-soft">
        {peaks.length < of ? `The ${peaks.length} largest of ${of} peaks` : 'All integrated peaks'}
      </caption>
      <thead>
        <tr>
          <th scope="col" className={`${head} text-left`}>
            Peak
          </th>
          <th scope="col" className={`${head} text-right`}>
            min
          </th>
          <th scope="col" className={`${head} text-right`}>
            Area %
          </th>
          <th scope="col" className={`${head} text-right`}>
            S/N
          </th>
          <th scope="col" className={`${head} pl-4 text-left`}>
            Assigned to
          </th>
        </tr>
      </thead>
      <tbody>
        {peaks.map((peak) => (
          <tr key={peak.number} className="border-b border-line">
            <th scope="row" className="py-1.5 text-left">
              {peak.number}
            </th>
            <td className="py-1.5 text-right">{peak.retentionTimeMin.toFixed(2)}</td>
            <td className="py-1.5 text-right">{peak.areaPercent.toFixed(2)}</td>
            <td className="py-1.5 text-right">{peak.signalToNoise?.toFixed(0) ?? 'not known'}</td>
            <td className="py-1.5 pl-4 break-words">{peak.compound ?? 'not assigned'}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

type SheetTracesProps = {
  traces: Trace[];
  /** By the trace's id. */
  pictures: Readonly<Record<string, SmallTrace>>;
  linked?: boolean;
};

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
                <PeakTable peaks={shown} of={integration.peaks.length} />
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
