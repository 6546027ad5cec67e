import type { Metadata } from 'next';
import Link from 'next/link';
import { PublicShell } from '@/components/shell/public-shell';
import { Notice, type NoticeKind } from '@/components/ui/notice';
import { checkSignature, type SignatureCheck } from '@/lib/signoff/check-signature';

export const metadata: Metadata = { title: 'Check a signature' };

const day = (iso: string) => iso.slice(0, 10);

function answerTo(check: SignatureCheck): { kind: NoticeKind; title: string; text: string } {
  if (!check.known)
    return {
      kind: 'needs you',
      title: 'This code is not known',
      text: 'Compare it with the certificate, sign by sign. If it is the same, no such signature was made here.',
    };
  if (!check.genuine)
    return {
      kind: 'fails',
      title: 'This signature is not genuine any more',
      text: 'What is kept of it does not match what was signed. Do not rely on the certificate; tell the laboratory.',
    };
  if (!check.inForce)
    return {
      kind: 'needs you',
      title: 'This signature is genuine, but no longer in force',
      text: `It was given on ${day(check.signedAt)}. ${
        check.supersededAt
          ? `On ${day(check.supersededAt)} it was superseded.`
          : 'The records under it have changed since.'
      } Ask the laboratory for a new one.`,
    };
  return {
    kind: 'info',
    title: 'This signature is genuine and in force',
    text: `It was given on ${day(check.signedAt)}, and the records under it are the same today.`,
  };
}

/** For anybody: whether a signature is genuine and in force, and nothing else. */
export default async function VerifyCodePage({ params }: { params: Promise<{ code: string }> }) {
  const code = decodeURIComponent((await params).code).slice(0, 60);
  const { kind, title, text } = answerTo(await checkSignature(code));
  return (
    <PublicShell about="Verification">
      <h1 className="mb-1 text-2xl">Check a signature</h1>
      <p className="mb-4 font-mono text-lg break-all">{code}</p>
      <Notice kind={kind} title={title}>
        {text}
      </Notice>
      <p className="mt-4">
        <Link href="/verify" className="link inline-flex min-h-target items-center">
          Check another code
        </Link>
      </p>
    </PublicShell>
  );
}
