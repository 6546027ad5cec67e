import type { Metadata } from 'next';
import { GroupsPanel } from '@/components/administration/groups-panel';
import { InstrumentsPanel } from '@/components/administration/instruments-panel';
import { PeoplePanel } from '@/components/administration/people-panel';
import { TokensPanel } from '@/components/administration/tokens-panel';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { whyNot } from '@/lib/auth/authorise';
import { requirePageActor } from '@/lib/auth/page-actor';

export const metadata: Metadata = { title: 'Administration' };

export default async function AdministrationPage() {
  const actor = await requirePageActor();
  const reason = whyNot(actor, 'administration.write', null);
  if (reason) {
    return (
      <>
        <PageHeader title="Administration" />
        <Notice title="For administrators">
          Ask an administrator of your site for what you need: an account, a role, an instrument or a token.
        </Notice>
      </>
    );
  }
  return (
    <>
      <PageHeader
        title="Administration"
        sub="Nobody here can sign for another, choose another's password, or delete evidence."
      />
      <div className="flex flex-col gap-12">
        <PeoplePanel />
        <GroupsPanel />
        <InstrumentsPanel />
        <TokensPanel />
      </div>
    </>
  );
}
