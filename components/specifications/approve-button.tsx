'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { sayDone, sayFailed } from '@/components/ui/toaster';
import { api, ApiError } from '@/lib/http/client';

/** Puts an edition in force. */
export function ApproveButton({
  id,
  version,
  whyNot,
}: {
  id: string;
  version: number;
  whyNot: string | null;
}) {
  const router = useRouter();
  const [busy, setBusy] = useState(false);
  async function approve() {
    setBusy(true);
    try {
      await api(`/api/v1/specifications/${id}/approve`, { method: 'POST', version });
      sayDone('The edition is in force');
      router.refresh();
    } catch (error) {
      sayFailed('Not approved', error instanceof ApiError ? error.detail : 'Try again.');
    } finally {
      setBusy(false);
    }
  }
  return (
    <Button busy={busy} disabledReason={whyNot} onClick={approve}>
      Approve
    </Button>
  );
}
