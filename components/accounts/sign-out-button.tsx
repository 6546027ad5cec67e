'use client';
import { signOut } from 'next-auth/react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';

/** Ends this browser's session and goes to the sign-in page. */
export function SignOutButton() {
  const [busy, setBusy] = useState(false);
  async function leave() {
    setBusy(true);
    await signOut({ redirect: false });
    // A full load, so that nothing of the last person stays in memory; the page then leads to sign-in.
    window.location.reload();
  }
  return (
    <Button busy={busy} onClick={() => void leave()}>
      Sign out
    </Button>
  );
}
