'use client';
import Link from 'next/link';
import { signIn } from 'next-auth/react';
import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { useReady } from '@/components/ui/use-ready';

/** Only paths of this app: a link that leads elsewhere after sign-in would be a trap. Read as the browser will read it. */
function safePath(next: string | undefined): string {
  if (!next || !URL.canParse(next, window.location.origin)) return '/bench';
  const target = new URL(next, window.location.origin);
  return target.origin === window.location.origin ? target.pathname + target.search : '/bench';
}

export function SignInForm({ next }: { next?: string }) {
  const ready = useReady();
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<string | null>(null);

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (busy) return;
    const form = new FormData(event.currentTarget);
    setBusy(true);
    setRefused(null);
    const answer = await signIn('credentials', {
      email: String(form.get('email')),
      password: String(form.get('password')),
      redirect: false,
    }).catch(() => null);
    if (answer?.ok) {
      window.location.assign(safePath(next));
      return;
    }
    setBusy(false);
    setRefused(
      answer
        ? 'E-mail and password do not go together, or there were too many tries. Check both; after several tries wait a little before the next.'
        : 'The server cannot be reached. Try again when the network is back.',
    );
  }

  return (
    <form method="post" onSubmit={(event) => void submit(event)} className="flex flex-col gap-4">
      {refused ? (
        <Notice kind="fails" live title="Not signed in">
          {refused}
        </Notice>
      ) : null}
      <Field label="E-mail" name="email" type="email" autoComplete="username" required autoFocus />
      <Field label="Password" name="password" type="password" autoComplete="current-password" required />
      <Button type="submit" variant="primary" busy={busy || !ready}>
        Sign in
      </Button>
      <p>
        <Link href="/forgotten-password" className="inline-block py-2 text-glass underline">
          Forgotten password
        </Link>
      </p>
    </form>
  );
}
