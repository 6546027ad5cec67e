'use client';
import { useMemo, useState } from 'react';
import useSWR from 'swr';
import { TracePlot, type TraceRange } from '@/components/charts/trace-plot';
import { Notice } from '@/components/ui/notice';
import { Skeleton } from '@/components/ui/skeleton';
import { baselineAt } from '@/lib/evidence/gc/baseline-at';
import type { IntegrationJson, PointsJson, TraceJson } from '@/lib/evidence/gc/schema';
import { fetcher } from '@/lib/http/client';
import { mergePoints } from './merge-points';
import { signalUnitOf } from './signal-unit';

type TracePictureProps = {
  trace: TraceJson;
  integration: IntegrationJson;
  selectedPeak: number | null;
  onSelectPeak: (number: number | null) => void;
  peakTableId: string;
};

/** The trace with baseline and peaks; finer points are fetched for the part that is zoomed into. */
export function TracePicture({
  trace,
  integration,
  selectedPeak,
  onSelectPeak,
  peakTableId,
}: TracePictureProps) {
  const [range, setRange] = useState<TraceRange | null>(null);
  // Points change with the reading of the file, which moves the version of the trace.
  const path = `/api/v1/traces/${trace.id}/points?pixels=1500`;
  const whole = useSWR<PointsJson>([path, trace.version], () => fetcher(path), { revalidateOnFocus: false });
  const partPath = whole.data?.thinned && range ? `${path}&from=${range.fromMin}&to=${range.toMin}` : null;
  const part = useSWR<PointsJson>(
    partPath && [partPath, trace.version],
    () => fetcher<PointsJson>(partPath!),
    { revalidateOnFocus: false, keepPreviousData: true },
  );
  const points = useMemo(
    () => whole.data && mergePoints(whole.data, range ? part.data : undefined),
    [whole.data, part.data, range],
  );
  const baseline = useMemo(
    () => points && baselineAt(integration.baseline, points.timeMin),
    [points, integration.baseline],
  );
  if (whole.error) {
    return (
      <Notice kind="fails" live title="The points could not be fetched">
        {(whole.error as Error).message} The peak table below is complete without the picture.
      </Notice>
    );
  }
  if (!points) return <Skeleton label="Fetching the trace" lines={8} />;
  return (
    <TracePlot
      name={`GC trace of ${trace.fraction ?? `the ${trace.subject} of ${trace.run}`}, ${trace.detector}`}
      timeMin={points.timeMin}
      signal={points.signal}
      signalUnit={signalUnitOf(trace.detected.columns, trace.detected.signalColumn)}
      baseline={baseline}
      peaks={integration.peaks.map(({ number, startMin, retentionTimeMin, endMin, compound }) => ({
        number,
        startMin,
        apexMin: retentionTimeMin,
        endMin,
        name: compound?.name,
      }))}
      selectedPeak={selectedPeak}
      onSelectPeak={onSelectPeak}
      peakTableId={peakTableId}
      onRangeChange={(next) =>
        setRange((now) => (now?.fromMin === next?.fromMin && now?.toMin === next?.toMin ? now : next))
      }
    />
  );
}
