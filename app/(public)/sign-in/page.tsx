import type { Metadata } from 'next';
import { SignInForm } from '@/components/accounts/sign-in-form';
import { PublicShell } from '@/components/shell/public-shell';

export const metadata: Metadata = { title: 'Sign in' };

export default async function SignInPage({ searchParams }: { searchParams: Promise<{ next?: string }> }) {
  const { next } = await searchParams;
  return (
    <PublicShell>
      <h1 className="mb-4 text-2xl">Sign in</h1>
      <SignInForm next={typeof next === 'string' ? next : undefined} />
    </PublicShell>
  );
}
