'use client';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import { sayDone } from '@/components/ui/toaster';
import type { RunJson } from '@/lib/distillation/schema';
import { api } from '@/lib/http/client';
import { failureOf, problemsOf } from './problems-of';
import { FormReader, numberText, type Problems } from './read-form';

/** Ends a run, with the residue as weighed. Nothing is closed by it: receivers can still be weighed. */
export function EndRun({ run, disabledReason }: { run: RunJson; disabledReason: string | null }) {
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [residue, setResidue] = useState(numberText(run.residueMassG));
  const [problems, setProblems] = useState<Problems>({});
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  async function end() {
    const read = new FormReader();
    const residueMassG = read.massG('residueMassG', residue);
    setProblems(read.problems);
    setFailure(null);
    if (!read.fine) return;
    setBusy(true);
    try {
      const json = { endedAt: new Date().toISOString(), residueMassG };
      await api(`/api/v1/runs/${run.code}`, { method: 'PATCH', json, version: run.version });
      setOpen(false);
      sayDone(`${run.code} has ended.`);
      router.refresh();
    } catch (error) {
      setProblems(problemsOf(error));
      setFailure(failureOf(error));
    } finally {
      setBusy(false);
    }
  }

  return (
    <>
      <Button onClick={() => setOpen(true)} disabledReason={disabledReason}>
        End the run
      </Button>
      <ConfirmDialog
        open={open}
        onOpenChange={setOpen}
        question={`End ${run.code} now?`}
        goes="The run no longer counts as running; its end is now."
        stays="Fractions can still be added, weighed and documented."
        confirmLabel="End the run"
        onConfirm={end}
        busy={busy}
        danger={false}
      >
        <NumberField
          label="Residue in the still"
          optional
          unit="g"
          hint="Net mass. It can be entered later."
          value={residue}
          error={problems.residueMassG}
          onChange={(event) => setResidue(event.target.value)}
        />
        {failure ? (
          <Notice kind="fails" title="The run was not ended" live>
            {failure}
          </Notice>
        ) : null}
      </ConfirmDialog>
    </>
  );
}
