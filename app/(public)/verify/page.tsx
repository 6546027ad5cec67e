import type { Metadata } from 'next';
import { VerifyForm } from '@/components/signoff/verify-form';
import { PublicShell } from '@/components/shell/public-shell';

export const metadata: Metadata = { title: 'Check a signature' };

export default function VerifyPage() {
  return (
    <PublicShell about="Verification">
      <h1 className="mb-4 text-2xl">Check a signature</h1>
      <VerifyForm />
      <p className="mt-4 text-sm text-ink-soft">
        The answer says whether the signature is genuine and still in force, and nothing else.
      </p>
    </PublicShell>
  );
}
