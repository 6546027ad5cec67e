import type { IntegrationJson } from '@/lib/evidence/gc/schema';

/** What an integration left out of its sum, and what it flags: nothing is dropped without a word. */
export function IntegrationRemarks({ integration }: { integration: IntegrationJson }) {
  const remarks = [
    ...integration.flags,
    ...integration.excludedPeaks.map(
      (peak) => `a peak at ${peak.retentionTimeMin.toFixed(2)} min is left out: ${peak.reason}`,
    ),
    ...integration.negativeDips.map(
      (dip) => `the signal dips under the baseline at ${dip.lowestMin.toFixed(2)} min, not counted`,
    ),
    integration.disregardedPeakCount > 0
      ? `${integration.disregardedPeakCount} ${integration.disregardedPeakCount === 1 ? 'peak' : 'peaks'} under ${integration.parameters.minimumAreaPercent} % left out of table and sum`
      : null,
  ].filter((remark) => remark !== null);
  if (remarks.length === 0) return null;
  return (
    <ul className="mb-3 flex list-disc flex-col gap-1 pl-5">
      {remarks.map((remark) => (
        <li key={remark}>{remark}</li>
      ))}
    </ul>
  );
}
