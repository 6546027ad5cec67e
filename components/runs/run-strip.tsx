'use client';
import { CutStrip } from '@/components/charts/cut-strip';
import type { RunSheet } from '@/lib/distillation/run-sheet';

type RunStripProps = {
  sheet: Pick<RunSheet, 'run' | 'fractions' | 'curve' | 'expected'>;
  /** The code of the fraction that the page is about. */
  current?: string;
};

/** The run drawn as its cuts, each leading to its fraction. */
export function RunStrip({ sheet, current }: RunStripProps) {
  const segments = sheet.fractions.map((fraction) => ({
    code: fraction.code,
    number: fraction.number,
    cut: fraction.cut,
    netMassG: fraction.netMassG,
    headTemperatureFromC: fraction.headTemperatureFromC,
    headTemperatureToC: fraction.headTemperatureToC,
    status: fraction.status,
    verdict: fraction.verdict,
    evidence: fraction.evidence,
    href: `/fractions/${fraction.code}`,
  }));
  return (
    <CutStrip
      title={`Run ${sheet.run.code}`}
      segments={segments}
      current={current}
      headCurve={sheet.curve}
      expectedBoilingPointC={sheet.expected?.boilingPointC ?? null}
    />
  );
}
