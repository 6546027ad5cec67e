import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { SheetFindings, SheetPictures, SheetRecord } from '@/components/fractions/evidence-sheet';
import { SheetFacts } from '@/components/fractions/sheet-facts';
import { SheetSection } from '@/components/ui/sheet-section';
import { PublicShell } from '@/components/shell/public-shell';
import { StateMark } from '@/components/states/state-mark';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { listTracePictures } from '@/lib/evidence/gc/list-trace-pictures';
import { findSharedSheet } from '@/lib/signoff/find-shared-sheet';

export const metadata: Metadata = { title: 'Shared evidence', referrer: 'no-referrer' };

/** The evidence sheet for somebody without an account: to read, not to change. */
export default async function SharePage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  const shared = await findSharedSheet(token);
  if (shared.state === 'ended') notFound();
  const { sheet, expiresAt } = shared;
  const pictures = await listTracePictures(
    sheet.traces.map((trace) => trace.id),
    300,
  );
  return (
    <PublicShell about="Shared evidence" width="page">
      <PageHeader
        title={sheet.code}
        state={
          <>
            <StateMark state={sheet.cut} />
            <StateMark state={sheet.status} />
            <StateMark state={sheet.verdict.state} />
          </>
        }
        sub={`${sheet.compound.name}${sheet.compound.cas ? ` (CAS ${sheet.compound.cas})` : ''}, ${sheet.group.name}`}
      />
      <div className="mb-6">
        <Notice title={sheet.verdict.summary}>
          To read until {expiresAt.toISOString().slice(0, 10)}. The code of the signature can be checked at
          any time.
        </Notice>
      </div>
      <SheetPictures
        sheet={sheet}
        pictures={pictures}
        pictureHref={(evidenceId) => `/share/${encodeURIComponent(token)}/photo/${evidenceId}?width=512`}
        linked={false}
      />
      <SheetSection id="facts" title="Receiver">
        <SheetFacts sheet={sheet} />
      </SheetSection>
      <SheetFindings sheet={sheet} />
      <SheetRecord sheet={sheet} linked={false} />
    </PublicShell>
  );
}
