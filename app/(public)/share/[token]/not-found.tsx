import { PublicShell } from '@/components/shell/public-shell';

/** For a read-only link that was never given, has expired, was revoked, or whose fraction is being worked on. */
export default function ShareNotFound() {
  return (
    <PublicShell about="Shared evidence">
      <h1 className="mb-4 text-2xl">This link is closed or unknown</h1>
      <p>
        It may no longer work: it has expired, was revoked, or the fraction is being worked on again; or a
        sign of the address is missing. Compare it with the message that it came in, or ask whoever sent it
        for a new one.
      </p>
    </PublicShell>
  );
}
