'use client';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import useSWR from 'swr';
import { TracePlot } from '@/components/charts/trace-plot';
import { failureOf, problemsOf } from '@/components/runs/problems-of';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { Skeleton } from '@/components/ui/skeleton';
import type { TraceJson, TracePreviewJson, TraceSubject } from '@/lib/evidence/gc/schema';
import { api, ApiError } from '@/lib/http/client';
import { nothingChosen, ReadFacts, readOf } from './read-facts';
import { SendTraceFile } from './send-trace-file';
import { signalUnitOf } from './signal-unit';

type TraceFile = { id: string; fileName: string };
type NewTraceProps = {
  fractionCode: string;
  runCode: string;
  files: TraceFile[];
  initialFileId: string | null;
  whyNotWrite: string | null;
};

const subjects: { value: TraceSubject; label: string }[] = [
  { value: 'fraction', label: 'this fraction' },
  { value: 'crude', label: 'the crude of the run' },
  { value: 'blank', label: 'a blank of the run' },
  { value: 'reference', label: 'a reference standard' },
];

/** Reads a trace in three steps on one page: which file, how it is read (detected, shown, confirmed), what it shows. */
export function NewTrace({ fractionCode, runCode, files, initialFileId, whyNotWrite }: NewTraceProps) {
  const router = useRouter();
  const [known, setKnown] = useState(files);
  const [fileId, setFileId] = useState(initialFileId ?? '');
  const [choices, setChoices] = useState(nothingChosen);
  const [subject, setSubject] = useState<TraceSubject>('fraction');
  const [detector, setDetector] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const [failure, setFailure] = useState<unknown>(null);
  const read = readOf(choices);
  const preview = useSWR<TracePreviewJson, ApiError>(
    fileId && [`/api/v1/evidence/${fileId}/trace-preview`, JSON.stringify(read)],
    ([path]: [string]) => api<TracePreviewJson>(path, { json: { read } }),
    { revalidateOnFocus: false, shouldRetryOnError: false },
  );
  const problem = preview.error ?? (failure instanceof ApiError ? failure : null);
  const problems = Object.fromEntries((problem?.errors ?? []).map(({ path, message }) => [path, message]));
  const detectorText = detector ?? preview.data?.detector ?? '';

  async function confirm() {
    setBusy(true);
    setFailure(null);
    try {
      const where = subject === 'fraction' ? { fraction: fractionCode } : { run: runCode };
      const trace = await api<TraceJson>('/api/v1/traces', {
        json: {
          evidenceId: fileId,
          ...where,
          subject,
          read,
          ...(detectorText.trim() && { detector: detectorText.trim() }),
        },
      });
      router.push(`/traces/${trace.id}`);
    } catch (error) {
      setFailure(error);
      setBusy(false);
    }
  }

  return (
    <div className="flex max-w-4xl flex-col gap-8">
      <section aria-labelledby="file-title" className="flex flex-col gap-4">
        <h2 id="file-title" className="text-lg">
          1. The file
        </h2>
        {known.length > 0 ? (
          <Select
            label="A file that is here already"
            value={fileId}
            onChange={(event) => {
              setFileId(event.target.value);
              setChoices(nothingChosen);
              setDetector(null);
            }}
            placeholder="choose"
            options={known.map((file) => ({ value: file.id, label: file.fileName }))}
          />
        ) : null}
        <SendTraceFile
          fractionCode={fractionCode}
          onSent={(file) => {
            setKnown((now) => [file, ...now.filter(({ id }) => id !== file.id)]);
            setFileId(file.id);
            setChoices(nothingChosen);
          }}
        />
      </section>
      {fileId ? (
        <section aria-labelledby="read-title" className="flex flex-col gap-4">
          <h2 id="read-title" className="text-lg">
            2. How it is read
          </h2>
          {preview.error ? (
            <Notice kind="fails" live title="The file is stored, but cannot be read like this">
              {preview.error.detail}
            </Notice>
          ) : null}
          {preview.isLoading ? <Skeleton label="Reading the file" lines={5} /> : null}
          {preview.data ? (
            <>
              <p>
                {preview.data.pointCount.toLocaleString('en')} points from {preview.data.startMin.toFixed(2)}{' '}
                min over <strong>{preview.data.durationMin.toFixed(2)} min</strong>; {preview.data.peakCount}{' '}
                {preview.data.peakCount === 1 ? 'peak' : 'peaks'} with the usual parameters. Does the length
                fit your method?
              </p>
              <TracePlot
                name="The trace as it would be read"
                timeMin={preview.data.timeMin}
                signal={preview.data.signal}
                signalUnit={signalUnitOf(preview.data.detected.columns, preview.data.detected.signalColumn)}
                height={240}
              />
            </>
          ) : null}
          <ReadFacts
            detected={preview.data?.detected ?? null}
            choices={choices}
            onChange={setChoices}
            problems={problems}
          />
        </section>
      ) : null}
      {preview.data ? (
        <section aria-labelledby="what-title" className="flex flex-col gap-4">
          <h2 id="what-title" className="text-lg">
            3. What it shows
          </h2>
          <div className="grid gap-4 sm:grid-cols-2">
            <Select
              label="It is the trace of"
              value={subject}
              onChange={(event) => setSubject(event.target.value as TraceSubject)}
              options={subjects}
            />
            <Field
              label="Detector"
              value={detectorText}
              onChange={(event) => setDetector(event.target.value)}
              placeholder="FID"
              hint="FID, TCD, MS …; left empty, FID is assumed, which sees no water."
              error={problems.detector}
            />
          </div>
          {failure ? (
            <Notice kind="fails" live title={failureOf(failure)}>
              {Object.values(problemsOf(failure)).join(' ')}
            </Notice>
          ) : null}
          <div>
            <Button variant="primary" busy={busy} disabledReason={whyNotWrite} onClick={() => void confirm()}>
              Read it like this
            </Button>
          </div>
        </section>
      ) : null}
    </div>
  );
}
