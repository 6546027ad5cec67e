'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Textarea } from '@/components/ui/textarea';

type ReasonDialogProps = {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** What happens, and what stays. */
  description: string;
  label: string;
  hint?: string;
  confirmLabel: string;
  optional?: boolean;
  busy: boolean;
  error: string | null;
  onConfirm: (reason: string) => void;
};

/** Asks for words to go with a step; required unless `optional`. */
export function ReasonDialog(props: ReasonDialogProps) {
  const [reason, setReason] = useState('');
  const [tried, setTried] = useState(false);
  const missing = !props.optional && reason.trim().length < 3;
  function confirm() {
    setTried(true);
    if (!missing) props.onConfirm(reason.trim());
  }
  return (
    <Dialog
      open={props.open}
      onOpenChange={props.onOpenChange}
      title={props.title}
      description={props.description}
      actions={
        <>
          <Button onClick={() => props.onOpenChange(false)}>Leave as it is</Button>
          <Button variant="primary" busy={props.busy} onClick={confirm}>
            {props.confirmLabel}
          </Button>
        </>
      }
    >
      <Textarea
        label={props.label}
        hint={props.hint}
        optional={props.optional}
        value={reason}
        onChange={(event) => setReason(event.target.value)}
        error={tried && missing ? 'Say why, in a few words.' : props.error}
        maxLength={1000}
      />
    </Dialog>
  );
}
