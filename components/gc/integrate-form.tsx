'use client';
import { useState, type FormEvent } from 'react';
import { failureOf, problemsOf } from '@/components/runs/problems-of';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import type { IntegrationParameters } from '@/lib/evidence/gc/parameters';
import type { IntegrationJson } from '@/lib/evidence/gc/schema';
import { api } from '@/lib/http/client';
import { ExcludedRanges } from './excluded-ranges';
import { parameterFields, parameterWords, readTexts, textsOf } from './parameter-fields';

type IntegrateFormProps = {
  traceId: string;
  parameters: IntegrationParameters;
  disabledReason: string | null;
  onDone: (made: IntegrationJson) => void;
};

/** The parameters of the integration, drawn from their schema, and a new version of it with a reason. */
export function IntegrateForm({ traceId, parameters, disabledReason, onDone }: IntegrateFormProps) {
  const [texts, setTexts] = useState(() => textsOf(parameters));
  const [reason, setReason] = useState('');
  const [busy, setBusy] = useState(false);
  const [problems, setProblems] = useState<Record<string, string>>({});
  const [failure, setFailure] = useState<string | null>(null);
  const setPlain = (key: string, value: string | boolean) =>
    setTexts((now) => ({ ...now, plain: { ...now.plain, [key]: value } }));

  async function send(event: FormEvent) {
    event.preventDefault();
    if (busy || disabledReason) return;
    const read = readTexts(texts);
    const missing: Record<string, string> =
      reason.trim().length < 3 ? { reason: 'Say why: the reason stays with the new version.' } : {};
    setProblems(read.ok ? missing : { ...read.problems, ...missing });
    setFailure(null);
    if (!read.ok || missing.reason) return;
    setBusy(true);
    try {
      const made = await api<IntegrationJson>(`/api/v1/traces/${traceId}/integrations`, {
        json: { reason, parameters: read.parameters },
      });
      setReason('');
      onDone(made);
    } catch (error) {
      setProblems(problemsOf(error));
      setFailure(failureOf(error));
    } finally {
      setBusy(false);
    }
  }

  return (
    <form noValidate onSubmit={(event) => void send(event)} className="flex max-w-prose flex-col gap-4">
      {failure ? <Notice kind="fails" live title={failure} /> : null}
      {parameterFields().map(({ key, kind, hint, choices }) => {
        const words = parameterWords[key] ?? { label: key };
        if (kind === 'switch') {
          return (
            <Checkbox
              key={key}
              label={words.label}
              hint={hint}
              checked={Boolean(texts.plain[key])}
              onChange={(event) => setPlain(key, event.target.checked)}
            />
          );
        }
        if (kind === 'choice') {
          return (
            <Select
              key={key}
              label={words.label}
              hint={hint}
              value={String(texts.plain[key])}
              onChange={(event) => setPlain(key, event.target.value)}
              options={choices.map((value) => ({ value, label: value.replaceAll('-', ' ') }))}
              error={problems[key]}
            />
          );
        }
        return (
          <NumberField
            key={key}
            label={words.label}
            unit={words.unit}
            hint={hint}
            value={String(texts.plain[key])}
            onChange={(event) => setPlain(key, event.target.value)}
            error={problems[key]}
          />
        );
      })}
      <Checkbox
        label="Smooth the signal first (Savitzky-Golay)"
        hint="Off by default: smoothing broadens narrow peaks."
        checked={texts.smoothing}
        onChange={(event) => setTexts((now) => ({ ...now, smoothing: event.target.checked }))}
      />
      {texts.smoothing ? (
        <div className="grid gap-4 sm:grid-cols-2">
          <NumberField
            label="Window"
            unit="points"
            hint="odd, 5 to 101"
            value={texts.windowPoints}
            onChange={(event) => setTexts((now) => ({ ...now, windowPoints: event.target.value }))}
            error={problems['smoothing.windowPoints'] ?? problems.smoothing}
          />
          <Select
            label="Order"
            value={texts.order}
            onChange={(event) => setTexts((now) => ({ ...now, order: event.target.value as '2' | '4' }))}
            options={[
              { value: '2', label: '2' },
              { value: '4', label: '4' },
            ]}
          />
        </div>
      ) : null}
      <ExcludedRanges
        ranges={texts.exclude}
        onChange={(exclude) => setTexts((now) => ({ ...now, exclude }))}
        problems={problems}
      />
      <Textarea
        label="Reason"
        hint="It stays with the new version; the present one stays on record."
        value={reason}
        onChange={(event) => setReason(event.target.value)}
        required
        error={problems.reason}
      />
      <div>
        <Button variant="primary" type="submit" busy={busy} disabledReason={disabledReason}>
          Integrate again
        </Button>
      </div>
    </form>
  );
}
