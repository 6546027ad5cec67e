'use client';
import Link from 'next/link';
import { useState } from 'react';
import useSWR from 'swr';
import { buttonClass } from '@/components/ui/button-class';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Skeleton } from '@/components/ui/skeleton';
import type { IntegrationJson, IntegrationRow, TraceJson } from '@/lib/evidence/gc/schema';
import { fetcher } from '@/lib/http/client';
import { IntegrateForm } from './integrate-form';
import { IntegrationRemarks } from './integration-remarks';
import { PeakTable } from './peak-table';
import { TraceFacts } from './trace-facts';
import { TracePicture } from './trace-picture';
import { VersionList } from './version-list';

/** A trace at work: picture and peak table linked both ways, parameters, versions. */
export function TraceView({ initial, whyNotWrite }: { initial: TraceJson; whyNotWrite: string | null }) {
  const path = `/api/v1/traces/${initial.id}`;
  const { data: trace = initial, mutate } = useSWR<TraceJson>(path, fetcher, { fallbackData: initial });
  const versions = useSWR<{ items: IntegrationRow[] }>(`${path}/integrations?limit=200`, fetcher);
  const [olderId, setOlderId] = useState<string | null>(null);
  const [selectedPeak, setSelectedPeak] = useState<number | null>(null);
  const older = useSWR<IntegrationJson>(olderId && `/api/v1/integrations/${olderId}`, fetcher);
  const integration = olderId ? older.data : trace.integration;
  const shown = integration ?? trace.integration;
  const looksBack = olderId !== null && shown.id !== trace.integration.id;

  async function refresh() {
    setOlderId(null);
    setSelectedPeak(null);
    await Promise.all([mutate(), versions.mutate()]);
  }
  function show(id: string) {
    setSelectedPeak(null);
    setOlderId(id === trace.integration.id ? null : id);
  }
  const selected = shown.peaks.find((peak) => peak.number === selectedPeak);

  return (
    <div className="flex flex-col gap-8">
      {!trace.confirmed || trace.detectorAssumed ? (
        <ReadingNotice trace={trace} whyNotWrite={whyNotWrite} />
      ) : null}
      {looksBack ? (
        <Notice
          title={`You look at version ${shown.version}; version ${trace.integration.version} is in force`}
          action={
            <Button onClick={() => setOlderId(null)}>Back to version {trace.integration.version}</Button>
          }
        >
          {shown.reason ?? 'The first integration, with the usual parameters.'}
          {JSON.stringify(shown.read) !== JSON.stringify(trace.read)
            ? ' It was made when the file was read in another way, so its times need not fit this picture.'
            : ''}
        </Notice>
      ) : null}
      <section aria-label="Picture">
        <TracePicture
          trace={trace}
          integration={shown}
          selectedPeak={selectedPeak}
          onSelectPeak={setSelectedPeak}
          peakTableId="peaks"
        />
        <p role="status" className="mt-1 min-h-5 text-sm">
          {selected
            ? `Peak ${selected.number}: ${selected.retentionTimeMin.toFixed(3)} min, ${selected.areaPercent.toFixed(3)} %, ${selected.compound?.name ?? 'not assigned'}.`
            : 'Press a peak in the picture or its number in the table to mark it in both.'}
        </p>
      </section>
      <section aria-labelledby="peaks-title">
        <h2 id="peaks-title" className="mb-2 text-lg">
          Peaks
        </h2>
        <IntegrationRemarks integration={shown} />
        <PeakTable
          id="peaks"
          peaks={shown.peaks}
          selectedPeak={selectedPeak}
          onSelectPeak={setSelectedPeak}
          assign={
            looksBack
              ? null
              : { traceId: trace.id, disabledReason: whyNotWrite, onDone: () => void refresh() }
          }
        />
        {whyNotWrite ? <p className="mt-2 text-sm text-ink-soft">To assign peaks: {whyNotWrite}</p> : null}
      </section>
      <section aria-labelledby="facts-title">
        <h2 id="facts-title" className="mb-2 text-lg">
          How it was read
        </h2>
        <TraceFacts trace={trace} integration={shown} />
      </section>
      <div className="grid gap-8 lg:grid-cols-2">
        <section aria-labelledby="parameters-title">
          <h2 id="parameters-title" className="mb-2 text-lg">
            Parameters{looksBack ? ` of version ${shown.version}` : ''}
          </h2>
          <IntegrateForm
            key={shown.id}
            traceId={trace.id}
            parameters={shown.parameters}
            disabledReason={whyNotWrite}
            onDone={() => void refresh()}
          />
        </section>
        <section aria-labelledby="versions-title">
          <h2 id="versions-title" className="mb-2 text-lg">
            Versions
          </h2>
          {versions.data ? (
            <VersionList versions={versions.data.items} shownId={shown.id} onShow={show} />
          ) : (
            <Skeleton label="Fetching the versions" />
          )}
        </section>
      </div>
    </div>
  );
}

function ReadingNotice({ trace, whyNotWrite }: { trace: TraceJson; whyNotWrite: string | null }) {
  const what = [
    trace.confirmed ? null : 'The file was read on arrival, and nobody has looked at how.',
    trace.detectorAssumed
      ? `Nothing tells the detector: ${trace.detector} is assumed, which sees no water.`
      : null,
    trace.detected.timeUnitFrom === 'assumed'
      ? 'The unit of time is assumed from the length of the trace.'
      : null,
  ];
  const href = trace.fraction
    ? `/fractions/${encodeURIComponent(trace.fraction)}/traces/new?evidence=${trace.evidence.id}`
    : null;
  return (
    <Notice
      kind="needs you"
      title="Confirm how this trace was read"
      action={
        whyNotWrite || !href ? null : (
          <Link href={href} className={buttonClass('primary')}>
            Look at the reading
          </Link>
        )
      }
    >
      {what.filter(Boolean).join(' ')} {whyNotWrite}
    </Notice>
  );
}
