import { Trend } from '@/components/charts/trend';
import type { SpecificationJson } from '@/lib/acceptance/specification-schema';
import type { PurityPoint } from '@/lib/compounds/purity-trend';

type PurityTrendProps = { points: readonly PurityPoint[]; inForce: readonly SpecificationJson[] };

/** Purity of the heart cuts of the reader's groups, oldest first, with the limit where one alone is in force. */
export function PurityTrend({ points, inForce }: PurityTrendProps) {
  const [only] = inForce;
  const least = inForce.length === 1 ? only?.criteria.gcAreaPercentMin : undefined;
  return (
    <Trend
      title="Purity of heart cuts by GC"
      unit="area %"
      limit={least === undefined ? null : { value: least, label: `at least ${least}` }}
      points={points.map(({ code, purityPercent, verdict }) => ({
        // The year is left out: a whole code does not fit under a point.
        label: code.replace(/^D-\d{4}-/, ''),
        value: purityPercent,
        verdict,
        href: `/fractions/${code}`,
      }))}
    />
  );
}
