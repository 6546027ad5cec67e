'use client';

import { useState } from 'react';
import { ReasonDialog } from '@/components/signoff/reason-dialog';
import { SignOffDialog } from '@/components/signoff/sign-off-dialog';
import { useStep } from '@/components/signoff/use-step';
import { Button } from '@/components/ui/button';
import type { FractionActions } from '@/lib/signoff/sign-off-rules';

type SheetActionsProps = { code: string; version: number; actions: FractionActions; signer: string };
type Open = 'submit' | 'return' | 'sign-off' | 'reopen' | null;

const dialogs = {
  submit: {
    title: 'Submit for sign-off?',
    description:
      'The analysts of the group get an e-mail. The sheet keeps the specification that is in force now.',
    label: 'A word to the analyst',
    confirmLabel: 'Submit',
    done: 'Submitted',
    optional: true,
    bodyOf: (text: string) => (text ? { comment: text } : {}),
  },
  return: {
    title: 'Return to the chemist?',
    description: 'The chemist gets an e-mail with your reason. All evidence stays.',
    label: 'What has to be done',
    confirmLabel: 'Return',
    done: 'Returned',
    optional: false,
    bodyOf: (text: string) => ({ reason: text }),
  },
  reopen: {
    title: 'Reopen this fraction?',
    description: 'Its signature no longer holds, and stays readable with your reason.',
    label: 'Why the signature no longer holds',
    confirmLabel: 'Reopen',
    done: 'Reopened',
    optional: false,
    bodyOf: (text: string) => ({ reason: text }),
  },
} as const;

/** What can be done with the fraction. Every action stays in sight; one that is not possible says why. */
export function SheetActions({ code, version, actions, signer }: SheetActionsProps) {
  const [open, setOpen] = useState<Open>(null);
  const { take, busy, error, clear } = useStep(code, version);
  const show = (which: Open) => {
    clear();
    setOpen(which);
  };
  const simple = open === 'submit' || open === 'return' || open === 'reopen' ? open : null;
  const dialog = simple ? dialogs[simple] : null;
  return (
    <div className="flex flex-wrap items-start gap-3 no-print">
      <Button variant="primary" disabledReason={actions.submit} onClick={() => show('submit')}>
        Submit
      </Button>
      <Button variant="primary" disabledReason={actions.signOff} onClick={() => show('sign-off')}>
        Sign off
      </Button>
      <Button disabledReason={actions.return} onClick={() => show('return')}>
        Return
      </Button>
      <Button disabledReason={actions.reopen} onClick={() => show('reopen')}>
        Reopen
      </Button>
      {simple && dialog ? (
        <ReasonDialog
          key={simple}
          open
          onOpenChange={() => setOpen(null)}
          {...dialog}
          busy={busy}
          error={error}
          onConfirm={async (text) => {
            if (await take(simple, dialog.bodyOf(text), `${code}: ${dialog.done}`)) setOpen(null);
          }}
        />
      ) : null}
      <SignOffDialog
        open={open === 'sign-off'}
        onOpenChange={() => setOpen(null)}
        code={code}
        signer={signer}
        busy={busy}
        error={error}
        onSign={async (body) => {
          if (await take('sign-off', body, `${code}: signed off`)) setOpen(null);
        }}
      />
    </div>
  );
}
