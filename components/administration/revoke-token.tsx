'use client';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { api } from '@/lib/http/client';
import type { PresentedToken } from '@/lib/instruments/schema';

export function RevokeToken({ token, onRevoked }: { token: PresentedToken; onRevoked: () => void }) {
  const [open, setOpen] = useState(false);
  const [busy, setBusy] = useState(false);
  if (token.revokedAt) return <span>revoked {token.revokedAt.slice(0, 10)}</span>;
  async function revoke() {
    setBusy(true);
    await api(`/api/v1/admin/tokens/${token.id}`, { method: 'DELETE' }).finally(() => setBusy(false));
    setOpen(false);
    onRevoked();
  }
  return (
    <>
      <Button variant="danger" onClick={() => setOpen(true)}>
        Revoke
      </Button>
      <ConfirmDialog
        open={open}
        onOpenChange={setOpen}
        question={`Revoke the token of ${token.name}?`}
        goes="The right of this machine to send anything, at once and for good"
        stays="Everything it has sent, and the instrument"
        confirmLabel="Revoke it"
        onConfirm={() => void revoke()}
        busy={busy}
      />
    </>
  );
}
