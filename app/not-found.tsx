import Link from 'next/link';
import { PublicShell } from '@/components/shell/public-shell';
import { buttonClass } from '@/components/ui/button-class';

export const metadata = { title: 'Not here' };

/** For an address that leads nowhere, and for records of a group that the reader is not a member of: the same page. */
export default function NotFound() {
  return (
    <PublicShell>
      <h1 className="text-xl">There is nothing at this address</h1>
      <p className="mt-2 mb-5 text-ink-soft">
        The address may have a typing error, or the record belongs to a group that you are not a member of.
        Check the code on the label; if it is right, ask the group&rsquo;s PI for access.
      </p>
      <Link href="/bench" className={buttonClass('primary')}>
        To the bench
      </Link>
    </PublicShell>
  );
}
