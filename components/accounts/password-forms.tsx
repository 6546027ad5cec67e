'use client';
import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { useReady } from '@/components/ui/use-ready';
import { api, ApiError } from '@/lib/http/client';

type State = { busy: boolean; problem: string | null; errors: Record<string, string>; done: boolean };
const quiet: State = { busy: false, problem: null, errors: {}, done: false };

/** Sends a form's values to the API and keeps what came back for the fields. */
function useSend(path: string) {
  const [state, setState] = useState(quiet);
  async function send(json: Record<string, string>): Promise<boolean> {
    setState({ ...quiet, busy: true });
    try {
      await api(path, { json });
      setState({ ...quiet, done: true });
      return true;
    } catch (error) {
      const { detail, errors } =
        error instanceof ApiError ? error : new ApiError(0, 'Something went wrong. Try again.');
      setState({
        ...quiet,
        problem: detail,
        errors: Object.fromEntries(errors.map((e) => [e.path, e.message])),
      });
      return false;
    }
  }
  return { state, setState, send };
}

const passwordHint = 'At least 12 characters. Several words are easiest to remember.';

/** Asks for a reset link. The answer is the same for every address. */
export function ForgottenPasswordForm() {
  const ready = useReady();
  const { state, send } = useSend('/api/v1/password-resets');
  if (state.done) {
    return (
      <Notice title="Look into your mailbox">
        If there is an account with this address, a link is on its way to it. It works for one hour.
      </Notice>
    );
  }
  function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    void send({ email: String(new FormData(event.currentTarget).get('email')) });
  }
  return (
    <form method="post" onSubmit={submit} className="flex flex-col gap-4">
      {state.problem ? <Notice kind="fails" live title={state.problem} /> : null}
      <Field
        label="E-mail"
        name="email"
        type="email"
        autoComplete="username"
        required
        error={state.errors.email}
      />
      <Button type="submit" variant="primary" busy={state.busy || !ready}>
        Send the link
      </Button>
    </form>
  );
}

/** Sets a password, by a mailed token or, with the present one, for the signed-in person. */
export function NewPasswordForm({ path, askPresent = false }: { path: string; askPresent?: boolean }) {
  const ready = useReady();
  const { state, setState, send } = useSend(path);
  if (state.done) {
    return (
      <Notice
        title="The new password is set"
        action={
          <a href="/sign-in" className="inline-block py-2 font-bold text-glass underline">
            Sign in with it
          </a>
        }
      >
        Every sign-in of this account has ended, on this machine too.
      </Notice>
    );
  }
  function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    const newPassword = String(form.get('newPassword'));
    if (newPassword !== form.get('again')) {
      setState({ ...quiet, errors: { again: 'The two are not the same. Type it again.' } });
      return;
    }
    void send(
      askPresent ? { currentPassword: String(form.get('currentPassword')), newPassword } : { newPassword },
    );
  }
  const unexplained = state.problem && Object.keys(state.errors).length === 0;
  return (
    <form method="post" onSubmit={submit} className="flex flex-col gap-4">
      {unexplained ? <Notice kind="fails" live title={state.problem} /> : null}
      {askPresent ? (
        <Field
          label="Present password"
          name="currentPassword"
          type="password"
          autoComplete="current-password"
          required
          error={state.errors.currentPassword}
        />
      ) : null}
      <Field
        label="New password"
        name="newPassword"
        type="password"
        autoComplete="new-password"
        required
        hint={passwordHint}
        error={state.errors.newPassword}
      />
      <Field
        label="New password again"
        name="again"
        type="password"
        autoComplete="new-password"
        required
        error={state.errors.again}
      />
      <Button type="submit" variant="primary" busy={state.busy || !ready}>
        Set the new password
      </Button>
    </form>
  );
}
