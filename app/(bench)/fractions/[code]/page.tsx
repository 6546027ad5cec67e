import type { Metadata } from 'next';
import Link from 'next/link';
import { SheetFindings, SheetPictures, SheetRecord } from '@/components/fractions/evidence-sheet';
import { SheetActions } from '@/components/fractions/sheet-actions';
import { SheetFacts } from '@/components/fractions/sheet-facts';
import { SheetSection } from '@/components/ui/sheet-section';
import { SheetPhotoUpload, SheetTraceUpload } from '@/components/fractions/sheet-upload';
import { ActionLink } from '@/components/runs/action-link';
import { RunStrip } from '@/components/runs/run-strip';
import { SharePanel } from '@/components/signoff/share-panel';
import { buttonClass } from '@/components/ui/button-class';
import { StateMark } from '@/components/states/state-mark';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { presentFractionSheet } from '@/lib/acceptance/fraction-sheet';
import { nextStepOf } from '@/lib/acceptance/next-step';
import { mayDo, whyNot } from '@/lib/auth/authorise';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { findRunSheet } from '@/lib/distillation/run-sheet';
import { listTracePictures } from '@/lib/evidence/gc/list-trace-pictures';

type Props = { params: Promise<{ code: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: decodeURIComponent((await params).code) };
}

/** The evidence sheet: state and next step, then pictures, findings, and the record. */
export default async function FractionPage({ params }: Props) {
  const actor = await requirePageActor();
  const sheet = await orPageNotFound(presentFractionSheet(actor, decodeURIComponent((await params).code)));
  const settled = sheet.status === 'signed off';
  const groupId = sheet.group.id;
  const [{ run, fractions, curve, expected }, pictures] = await Promise.all([
    findRunSheet(actor, sheet.run),
    listTracePictures(
      sheet.traces.map((trace) => trace.id),
      300,
    ),
  ]);
  const whyNotSend = whyNot(actor, 'evidence.write', groupId);
  const add = {
    photo: <SheetPhotoUpload fractionCode={sheet.code} runCode={sheet.run} whyNot={whyNotSend} />,
    trace: <SheetTraceUpload fractionCode={sheet.code} whyNot={whyNotSend} />,
    refractive: (
      <p className="mt-3 no-print">
        <ActionLink
          href={`/fractions/${sheet.code}/refractive-index`}
          reason={whyNot(actor, 'refractiveIndex.write', groupId)}
        >
          Enter readings
        </ActionLink>
      </p>
    ),
  };
  return (
    <>
      <PageHeader
        title={sheet.code}
        trail={[
          { href: '/runs', label: 'Runs' },
          { href: `/runs/${sheet.run}`, label: sheet.run },
        ]}
        state={
          <>
            <StateMark state={sheet.cut} />
            <StateMark state={sheet.status} />
            <StateMark state={sheet.verdict.state} />
          </>
        }
        sub={
          <>
            <Link href={`/compounds/${sheet.compound.id}`} className="link">
              {sheet.compound.name}
            </Link>
            , {sheet.group.name}
          </>
        }
      />
      <div className="mb-6 flex flex-col gap-4">
        <Notice
          kind={settled ? 'info' : sheet.verdict.state === 'fail' ? 'fails' : 'needs you'}
          title={sheet.verdict.summary}
        >
          Next: {nextStepOf(sheet)}
        </Notice>
        <SheetActions code={sheet.code} version={sheet.version} actions={sheet.actions} signer={actor.name} />
      </div>
      <SheetSection id="run" title={`In run ${sheet.run}`}>
        <RunStrip sheet={{ run, fractions, curve, expected }} current={sheet.code} />
      </SheetSection>
      <SheetPictures sheet={sheet} pictures={pictures} add={add} />
      <SheetSection
        id="facts"
        title="Receiver"
        action={
          <Link href={`/runs/${sheet.run}/fractions/${sheet.number}`} className={buttonClass()}>
            Edit facts
          </Link>
        }
      >
        <SheetFacts sheet={sheet} />
      </SheetSection>
      <SheetFindings sheet={sheet} add={add} />
      <SheetRecord sheet={sheet} />
      {mayDo(actor, 'audit.read', sheet.group.id) ? (
        <p className="mb-8">
          <Link
            href={`/audit?record=fraction:${sheet.id}`}
            className="link inline-flex min-h-target items-center"
          >
            Every change of this fraction
          </Link>
        </p>
      ) : null}
      {mayDo(actor, 'share.write', sheet.group.id) ? (
        <SheetSection id="links" title="Read-only links">
          <SharePanel code={sheet.code} whyNot={sheet.actions.share} />
        </SheetSection>
      ) : null}
    </>
  );
}
