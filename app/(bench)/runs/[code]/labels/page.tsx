import type { Metadata } from 'next';
import { FractionLabelView } from '@/components/runs/fraction-label';
import { PrintButton } from '@/components/runs/print-button';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { listFractionLabels } from '@/lib/distillation/fraction-labels';

export const metadata: Metadata = { title: 'Labels' };

type Props = {
  params: Promise<{ code: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
};

export default async function LabelsPage({ params, searchParams }: Props) {
  const actor = await requirePageActor();
  const { code } = await params;
  const { fraction } = await searchParams;
  const only = typeof fraction === 'string' ? fraction : undefined;
  const labels = await orPageNotFound(listFractionLabels(actor, code, only));
  return (
    <>
      <div className="no-print">
        <PageHeader
          title="Labels"
          trail={[
            { href: '/runs', label: 'Runs' },
            { href: `/runs/${code}`, label: code },
          ]}
          sub="70 mm × 36 mm each. The QR code opens the fraction; print at 100 %, without fitting to the page."
          actions={labels.length > 0 ? <PrintButton>Print</PrintButton> : null}
        />
      </div>
      {labels.length > 0 ? (
        <div className="flex flex-wrap gap-[3mm]">
          {labels.map((label) => (
            <FractionLabelView key={label.code} label={label} />
          ))}
        </div>
      ) : (
        <EmptyState title="No fraction to label.">
          Start a fraction in the run; its label can be printed at once.
        </EmptyState>
      )}
    </>
  );
}
