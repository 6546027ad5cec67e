import { DefinitionList } from '@/components/ui/definition-list';
import type { IntegrationJson, TraceJson } from '@/lib/evidence/gc/schema';

const delimiterWords: Record<string, string> = {
  tab: 'tab',
  space: 'blank',
  ',': 'comma',
  ';': 'semicolon',
  '|': 'bar',
};
const unitWords: Record<string, string> = { s: 'seconds', min: 'minutes', ms: 'milliseconds', h: 'hours' };

/** How a unit of time came to be known, in words. */
export function timeUnitText({ timeUnit, timeUnitFrom }: TraceJson['detected']): string {
  if (timeUnitFrom === 'sampling') return 'from the sampling rate';
  const how = { given: 'as given', heading: 'by the heading', assumed: 'assumed' }[timeUnitFrom];
  return `${unitWords[timeUnit] ?? timeUnit}, ${how}`;
}

export function delimiterText(delimiter: string): string {
  return delimiterWords[delimiter] ?? delimiter;
}

/** What the trace is, and how its file was read. */
export function TraceFacts({ trace, integration }: { trace: TraceJson; integration: IntegrationJson }) {
  const { detected } = trace;
  return (
    <DefinitionList
      columns={2}
      items={[
        {
          term: 'Shows',
          value: trace.fraction ? `${trace.subject} ${trace.fraction}` : `${trace.subject} of ${trace.run}`,
        },
        { term: 'Detector', value: trace.detector, condition: trace.detectorAssumed ? 'assumed' : null },
        {
          term: 'Length',
          value: trace.durationMin.toFixed(2),
          unit: 'min',
          condition: `${trace.pointCount.toLocaleString('en')} points`,
        },
        { term: 'File', value: <span className="break-all">{trace.evidence.fileName}</span> },
        { term: 'Times', value: timeUnitText(detected) },
        {
          term: 'Signal column',
          value: detected.columns[detected.signalColumn] ?? `column ${detected.signalColumn + 1}`,
          condition: `${delimiterText(detected.delimiter)}-separated, decimal ${detected.decimal === ',' ? 'comma' : 'point'}`,
        },
        {
          term: 'Noise, peak to peak',
          value: integration.noise.toPrecision(3),
          condition: integration.noiseMethod,
        },
        { term: 'Method', value: integration.methodVersion, source: `integrated by ${integration.author}` },
      ]}
    />
  );
}
