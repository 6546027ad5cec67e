import type { Metadata } from 'next';
import { TrayList } from '@/components/tray/tray-list';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { requirePageActor } from '@/lib/auth/page-actor';
import { listRecentFractionCodes, listTray } from '@/lib/instruments/list-tray';
import { whyNoTray } from '@/lib/instruments/tray-policy';

export const metadata: Metadata = { title: 'Tray' };

export default async function TrayPage() {
  const actor = await requirePageActor();
  const reason = whyNoTray(actor);
  return (
    <>
      <PageHeader
        title="Tray"
        sub="Files that wait for their fraction. Nothing that an instrument sends is lost."
      />
      {reason ? (
        <Notice title="Not for your roles">{reason}</Notice>
      ) : (
        <TrayList first={await listTray(actor, { limit: 20 })} codes={await listRecentFractionCodes(actor)} />
      )}
    </>
  );
}
