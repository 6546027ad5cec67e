import type { Metadata } from 'next';
import { NewPasswordForm } from '@/components/accounts/password-forms';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { requirePageActor } from '@/lib/auth/page-actor';

export const metadata: Metadata = { title: 'Change password' };

export default async function PasswordPage() {
  const actor = await requirePageActor();
  return (
    <div className="max-w-form">
      <PageHeader
        title="Change password"
        trail={actor.mustChangePassword ? [] : [{ href: '/account', label: 'Account' }]}
      />
      {actor.mustChangePassword ? (
        <div className="mb-4">
          <Notice kind="needs you" title="Choose your own password first">
            An administrator made this account. Your signature must rest on a password that only you know.
          </Notice>
        </div>
      ) : null}
      <NewPasswordForm path="/api/v1/account/password" askPresent />
    </div>
  );
}
