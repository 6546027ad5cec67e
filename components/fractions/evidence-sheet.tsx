import type { ReactNode } from 'react';
import type { SmallTrace } from '@/components/charts/small-chromatogram-layout';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';
import { SheetCoverage } from './sheet-coverage';
import { SheetCriteria } from './sheet-criteria';
import { SheetFiles } from './sheet-files';
import { SheetSignatures, SheetSteps } from './sheet-history';
import { SheetBoilingRange, SheetRefractive } from './sheet-measurements';
import { SheetPhotos } from './sheet-photos';
import { SheetSection } from '@/components/ui/sheet-section';
import { SheetTraces } from './sheet-traces';

type Sheet = Omit<FractionSheet, 'actions'>;

/** Where evidence is added, on a page whose reader has an account. */
export type SheetEntries = { photo?: ReactNode; trace?: ReactNode; refractive?: ReactNode };

/** Photos and plots, for those who look first. */
export function SheetPictures({
  sheet,
  pictures,
  pictureHref = (evidenceId) => `/api/v1/evidence/${evidenceId}/preview?width=512`,
  linked,
  add = {},
}: {
  sheet: Sheet;
  /** Of the traces, by their id. */
  pictures: Readonly<Record<string, SmallTrace>>;
  pictureHref?: (evidenceId: string) => string;
  linked?: boolean;
  add?: SheetEntries;
}) {
  return (
    <div className="grid gap-x-6 lg:grid-cols-2">
      <SheetSection id="plates" title="Plates">
        <SheetPhotos plates={sheet.plates} linked={linked} pictureHref={pictureHref} />
        {add.photo}
      </SheetSection>
      <SheetSection id="traces" title="Gas chromatograms">
        <SheetTraces traces={sheet.traces} pictures={pictures} linked={linked} />
        {add.trace}
      </SheetSection>
    </div>
  );
}

/** What was judged and measured, and the blind spots. */
export function SheetFindings({ sheet, add = {} }: { sheet: Sheet; add?: SheetEntries }) {
  return (
    <>
      <SheetSection id="criteria" title="Verdict by criteria">
        <SheetCriteria verdict={sheet.verdict} />
      </SheetSection>
      <SheetSection id="coverage" title="What the tests can see">
        <SheetCoverage coverage={sheet.coverage} />
      </SheetSection>
      <div className="grid gap-x-6 lg:grid-cols-2">
        <SheetSection id="refractive-index" title="Refractive index">
          <SheetRefractive readings={sheet.refractiveReadings} />
          {add.refractive}
        </SheetSection>
        <SheetSection id="boiling-range" title="Boiling range">
          <SheetBoilingRange range={sheet.boilingRange} />
        </SheetSection>
      </div>
    </>
  );
}

/** Signatures, steps and the original files. */
export function SheetRecord({ sheet, linked }: { sheet: Sheet; linked?: boolean }) {
  return (
    <>
      <SheetSection id="signatures" title="Signatures">
        <SheetSignatures signatures={sheet.signatures} />
      </SheetSection>
      <SheetSection id="steps" title="History">
        <SheetSteps transitions={sheet.transitions} />
      </SheetSection>
      <SheetSection id="files" title="Files">
        <SheetFiles files={sheet.evidence} linked={linked} />
      </SheetSection>
    </>
  );
}
