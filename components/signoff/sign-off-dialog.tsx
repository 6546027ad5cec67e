'use client';

import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { signatureMeanings } from '@/lib/signoff/schema';

type SignOffDialogProps = {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  code: string;
  signer: string;
  busy: boolean;
  error: string | null;
  onSign: (body: { password: string; meaning: string; comment?: string }) => void;
};

/** The signature: who, what it means, and the password once more. */
export function SignOffDialog({ open, onOpenChange, code, signer, busy, error, onSign }: SignOffDialogProps) {
  const [meaning, setMeaning] = useState<string>(signatureMeanings[0]);
  const [comment, setComment] = useState('');
  const [password, setPassword] = useState('');
  const [tried, setTried] = useState(false);

  function sign(event: FormEvent) {
    event.preventDefault();
    setTried(true);
    if (!password) return;
    onSign({ password, meaning, ...(comment.trim() ? { comment: comment.trim() } : {}) });
    setPassword('');
    setTried(false);
  }
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={`Sign off ${code}`}
      description={`You sign as ${signer}. The signature is bound to everything on the sheet as it is now; a later change ends its force.`}
      actions={
        <>
          <Button onClick={() => onOpenChange(false)}>Leave as it is</Button>
          <Button variant="primary" type="submit" form="sign-off" busy={busy}>
            Sign off
          </Button>
        </>
      }
    >
      <form id="sign-off" onSubmit={sign} className="flex flex-col gap-4">
        <Select
          label="Meaning of the signature"
          value={meaning}
          onChange={(event) => setMeaning(event.target.value)}
          options={signatureMeanings.map((value) => ({ value, label: value }))}
        />
        <Textarea
          label="Comment"
          optional
          value={comment}
          maxLength={1000}
          onChange={(event) => setComment(event.target.value)}
        />
        <Field
          label="Your password, once more"
          type="password"
          autoComplete="current-password"
          value={password}
          onChange={(event) => setPassword(event.target.value)}
          error={tried && !password ? 'Type your password to sign.' : null}
        />
        {error ? (
          <Notice kind="fails" title="Not signed" live>
            {error}
          </Notice>
        ) : null}
      </form>
    </Dialog>
  );
}
