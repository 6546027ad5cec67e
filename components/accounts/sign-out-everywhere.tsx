'use client';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { api } from '@/lib/http/client';

/** Ends every sign-in of the account: for a lost phone. */
export function SignOutEverywhere() {
  const [open, setOpen] = useState(false);
  const [busy, setBusy] = useState(false);
  async function confirm() {
    setBusy(true);
    await api('/api/v1/account/sign-out-everywhere', { method: 'POST' }).catch(() => undefined);
    // A full load, so that nothing of the last person stays in memory; the page then leads to sign-in.
    window.location.reload();
  }
  return (
    <>
      <Button onClick={() => setOpen(true)}>End all sign-ins</Button>
      <ConfirmDialog
        open={open}
        onOpenChange={setOpen}
        question="End all sign-ins of this account?"
        goes="Every session, on all phones and machines, this one too"
        stays="The account, its password and everything recorded"
        confirmLabel="End all sign-ins"
        onConfirm={() => void confirm()}
        busy={busy}
      />
    </>
  );
}
