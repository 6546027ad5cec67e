import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { PhotoSection } from '@/components/plate-report/photo-section';
import { PrintButton } from '@/components/runs/print-button';
import { DefinitionList } from '@/components/ui/definition-list';
import { PageHeader } from '@/components/ui/page-header';
import { orPageNotFound, requirePageActor } from '@/lib/auth/page-actor';
import { isId } from '@/lib/database/ids';
import { plateReport } from '@/lib/evidence/tlc/plate-report';

export const metadata: Metadata = { title: 'Plate report' };

type Props = { params: Promise<{ id: string }> };

export default async function PlateReportPage({ params }: Props) {
  const actor = await requirePageActor();
  const { id } = await params;
  if (!isId(id)) notFound();
  const { plate, target, markedBy, photos } = await orPageNotFound(plateReport(actor, id));
  const size = plate.widthMm && plate.heightMm ? `${plate.widthMm} × ${plate.heightMm}` : null;
  return (
    <>
      <PageHeader
        title="Plate report"
        trail={[
          { href: `/runs/${encodeURIComponent(plate.run)}`, label: plate.run },
          { href: `/plates/${plate.id}`, label: 'Plate' },
        ]}
        sub={`Run ${plate.run}, ${target}`}
        actions={
          <div className="no-print">
            <PrintButton>Print</PrintButton>
          </div>
        }
      />
      <DefinitionList
        columns={2}
        items={[
          { term: 'Stationary phase', value: plate.stationaryPhase },
          { term: 'Eluent', value: plate.eluent },
          { term: 'Visualisers', value: photos.map((one) => one.visualiser).join(', ') },
          { term: 'Plate, width × height', value: size, unit: 'mm' },
          { term: 'Marked by', value: markedBy },
          { term: 'Marks of', value: `${plate.updatedAt.slice(0, 16).replace('T', ' ')} UTC` },
          { term: 'Method', value: plate.methodVersion },
          { term: 'Note', value: plate.note ?? '–' },
        ]}
      />
      {photos.map((report) => (
        <PhotoSection key={report.photo.id} report={report} />
      ))}
    </>
  );
}
