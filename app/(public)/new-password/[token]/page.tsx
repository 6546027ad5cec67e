import type { Metadata } from 'next';
import { NewPasswordForm } from '@/components/accounts/password-forms';
import { PublicShell } from '@/components/shell/public-shell';

export const metadata: Metadata = { title: 'New password', referrer: 'no-referrer' };

export default async function NewPasswordPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  return (
    <PublicShell>
      <h1 className="mb-4 text-2xl">Set a new password</h1>
      <NewPasswordForm path={`/api/v1/password-resets/${encodeURIComponent(token)}`} />
    </PublicShell>
  );
}
