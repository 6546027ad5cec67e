import type { Metadata } from 'next';
import Link from 'next/link';
import { ForgottenPasswordForm } from '@/components/accounts/password-forms';
import { PublicShell } from '@/components/shell/public-shell';

export const metadata: Metadata = { title: 'Forgotten password' };

export default function ForgottenPasswordPage() {
  return (
    <PublicShell>
      <h1 className="mb-2 text-2xl">Forgotten password</h1>
      <p className="mb-4">
        Write your e-mail address. You get a link with which you set a new password yourself.
      </p>
      <ForgottenPasswordForm />
      <p className="mt-4">
        <Link href="/sign-in" className="inline-block py-2 text-glass underline">
          Back to sign-in
        </Link>
      </p>
    </PublicShell>
  );
}
