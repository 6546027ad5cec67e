'use client';

import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { EvidenceUploader } from '@/components/evidence/evidence-uploader';
import { buttonClass } from '@/components/ui/button-class';

type SheetUploadProps = { fractionCode: string; runCode: string; whyNot: string | null };

/** Adds a plate photo and leads to marking it. */
export function SheetPhotoUpload({ fractionCode, runCode, whyNot }: SheetUploadProps) {
  const router = useRouter();
  return (
    <div className="mt-3 flex flex-col gap-2 no-print">
      <EvidenceUploader
        fractionCode={fractionCode}
        kind="plate-photo"
        disabledReason={whyNot}
        onStored={() => router.refresh()}
      />
      <p>
        <Link href={`/plates/new?run=${encodeURIComponent(runCode)}`} className={buttonClass()}>
          Mark a plate
        </Link>
      </p>
    </div>
  );
}

/** Adds a chromatogram's file and leads to reading it. */
export function SheetTraceUpload({ fractionCode, whyNot }: Omit<SheetUploadProps, 'runCode'>) {
  const router = useRouter();
  return (
    <div className="mt-3 flex flex-col gap-2 no-print">
      <EvidenceUploader
        fractionCode={fractionCode}
        kind="gc-trace"
        disabledReason={whyNot}
        onStored={() => router.refresh()}
      />
      <p>
        <Link href={`/fractions/${encodeURIComponent(fractionCode)}/traces/new`} className={buttonClass()}>
          Read a GC trace
        </Link>
      </p>
    </div>
  );
}
