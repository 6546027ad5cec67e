'use client';
import { useId, useState, type FormEvent } from 'react';
import { searchCompounds } from '@/components/runs/compound-search';
import { failureOf, problemsOf } from '@/components/runs/problems-of';
import { Button } from '@/components/ui/button';
import { Combobox } from '@/components/ui/combobox';
import { Dialog } from '@/components/ui/dialog';
import { Notice } from '@/components/ui/notice';
import { Textarea } from '@/components/ui/textarea';
import type { PeakJson } from '@/lib/evidence/gc/schema';
import { api } from '@/lib/http/client';

type AssignPeakProps = {
  peak: PeakJson;
  traceId: string;
  disabledReason: string | null;
  onDone: () => void;
};

/** Says which compound a peak is, or that it is not known after all: a new version with its reason. */
export function AssignPeak({ peak, traceId, disabledReason, onDone }: AssignPeakProps) {
  const formId = useId();
  const [open, setOpen] = useState(false);
  const [compound, setCompound] = useState<string | null>(peak.compound?.id ?? null);
  const [reason, setReason] = useState('');
  const [busy, setBusy] = useState(false);
  const [failure, setFailure] = useState<unknown>(null);
  const problems = problemsOf(failure);
  if (disabledReason) return null;

  async function send(event: FormEvent) {
    event.preventDefault();
    if (busy) return;
    setBusy(true);
    setFailure(null);
    try {
      await api(`/api/v1/traces/${traceId}/integrations`, {
        json: { reason, assign: [{ peak: peak.number, compound }] },
      });
      setOpen(false);
      setReason('');
      onDone();
    } catch (error) {
      setFailure(error);
    } finally {
      setBusy(false);
    }
  }

  return (
    <>
      <Button variant="quiet" onClick={() => setOpen(true)} aria-label={`Assign peak ${peak.number}`}>
        {peak.compound ? 'Change' : 'Assign'}
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={`Which compound is peak ${peak.number}?`}
        description={`At ${peak.retentionTimeMin.toFixed(3)} min, ${peak.areaPercent.toFixed(3)} % of the area. This makes a new version of the integration; the present one stays on record.`}
        actions={
          <>
            <Button onClick={() => setOpen(false)}>Leave as it is</Button>
            <Button variant="primary" type="submit" form={formId} busy={busy}>
              {compound ? 'Assign it' : 'Leave it unassigned'}
            </Button>
          </>
        }
      >
        <form
          id={formId}
          noValidate
          onSubmit={(event) => void send(event)}
          className="flex min-h-80 flex-col gap-4"
        >
          {failure ? <Notice kind="fails" live title={failureOf(failure)} /> : null}
          <Combobox
            label="Compound"
            optional
            hint="Empty the field to take the assignment away."
            search={searchCompounds}
            initial={peak.compound && { value: peak.compound.id, label: peak.compound.name }}
            onChoose={(option) => setCompound(option?.value ?? null)}
            nothingFound="Nothing found: a PI can add it under Compounds."
            error={problems.assign}
          />
          <Textarea
            label="Reason"
            hint="For example: same time as the reference of today."
            value={reason}
            onChange={(event) => setReason(event.target.value)}
            required
            error={problems.reason}
          />
        </form>
      </Dialog>
    </>
  );
}
