import { findState } from '@/components/states/marks';
import { StateMark } from '@/components/states/state-mark';
import { EVIDENCE_KINDS, EVIDENCE_NAMES, type CutStripSegment } from './cut-strip-types';

/** "58.2 to 61.0 °C", with what is not recorded said in words. */
export function formatHeadRange(
  segment: Pick<CutStripSegment, 'headTemperatureFromC' | 'headTemperatureToC'>,
): string {
  const { headTemperatureFromC: from, headTemperatureToC: to } = segment;
  if (from === null && to === null) return 'not recorded';
  if (from === null || to === null) return `${(from ?? to)!.toFixed(1)} °C`;
  return `${from.toFixed(1)} to ${to.toFixed(1)} °C`;
}

/** All that a segment says, in one sentence for a screen reader. */
export function describeSegment(segment: CutStripSegment): string {
  const word = (state: string) => findState(state)?.word ?? state;
  return [
    // Begins with what stands in the drawing, so that whoever says what they see reaches it (WCAG 2.5.3).
    `${segment.number} ${word(segment.cut)}`,
    segment.netMassG === null ? 'not weighed' : `${segment.netMassG.toFixed(2)} g`,
    `head temperature ${formatHeadRange(segment)}`,
    word(segment.status),
    segment.verdict ? `verdict ${word(segment.verdict)}` : 'no verdict yet',
    ...EVIDENCE_KINDS.map((kind) => `${EVIDENCE_NAMES[kind].full} ${word(segment.evidence[kind])}`),
  ].join(', ');
}

/** The strip as a table, for whoever would rather read than look. */
export function CutStripTable({ segments, title }: { segments: readonly CutStripSegment[]; title: string }) {
  const head = 'border-b border-line-strong px-2 py-1.5 text-left font-bold whitespace-nowrap';
  const cell = 'border-b border-line px-2 py-1.5 whitespace-nowrap';
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={`${title} as a table`}>
      <table className="w-full border-collapse text-sm">
        <caption className="sr-only">{title}</caption>
        <thead>
          <tr>
            {['Fraction', 'Cut', 'Net mass', 'Head temperature', 'Status', 'Verdict'].map((text) => (
              <th key={text} scope="col" className={head}>
                {text}
              </th>
            ))}
            {EVIDENCE_KINDS.map((kind) => (
              <th key={kind} scope="col" className={head}>
                <abbr title={EVIDENCE_NAMES[kind].full} className="no-underline">
                  {EVIDENCE_NAMES[kind].short}
                </abbr>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {segments.map((segment) => (
            <tr key={segment.code}>
              <th scope="row" className={`${cell} text-left`}>
                {segment.href ? (
                  <a href={segment.href} className="link">
                    {segment.number}
                  </a>
                ) : (
                  segment.number
                )}
              </th>
              <td className={cell}>
                <StateMark state={segment.cut} look="plain" />
              </td>
              <td className={cell}>
                {segment.netMassG === null ? 'not weighed' : `${segment.netMassG.toFixed(2)} g`}
              </td>
              <td className={cell}>{formatHeadRange(segment)}</td>
              <td className={cell}>
                <StateMark state={segment.status} look="plain" />
              </td>
              <td className={cell}>
                {segment.verdict ? <StateMark state={segment.verdict} look="plain" /> : 'none yet'}
              </td>
              {EVIDENCE_KINDS.map((kind) => (
                <td key={kind} className={cell}>
                  <StateMark state={segment.evidence[kind]} look="plain" />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
