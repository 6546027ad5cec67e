import { findState, type Tone } from './marks';
import { MarkGlyph } from './mark-glyph';

const TONE_TEXT: Record<Tone, string> = {
  glass: 'text-glass',
  ink: 'text-ink',
  soft: 'text-ink-soft',
  needs: 'text-needs',
  fails: 'text-fails',
};

const TONE_CHIP: Record<Tone, string> = {
  glass: 'bg-glass-wash border-glass/30',
  ink: 'bg-paper-sunk border-line',
  soft: 'bg-transparent border-line',
  needs: 'bg-needs-wash border-needs/30',
  fails: 'bg-fails-wash border-fails/30',
};

type StateMarkProps = {
  /** A state code or word: `signed_off`, `fore-run`, `not done` … */
  state: string;
  /** What follows the word, such as `down to 0.1 %`. */
  detail?: string;
  size?: 'sm' | 'md' | 'lg';
  /** `chip` on a ground of its own tone, `plain` in running text and dense tables. */
  look?: 'chip' | 'plain';
  /** Hides the word from the eye, never from a screen reader; only where a heading or legend gives the word. */
  wordHidden?: boolean;
  className?: string;
};

/**
 * The one way a state is shown: its word with its own mark. Throws for a state that marks.ts does not know, because an
 * unknown state shown as if it were a known one would be worse than a broken page.
 */
export function StateMark({
  state,
  detail,
  size = 'md',
  look = 'chip',
  wordHidden = false,
  className = '',
}: StateMarkProps) {
  const entry = findState(state);
  if (!entry) throw new Error(`No mark for the state "${state}": add it to components/states/marks.ts.`);
  const text = { sm: 'text-xs gap-1', md: 'text-sm gap-1.5', lg: 'text-lg gap-2' }[size];
  const room = { sm: 'px-1.5 py-0.5', md: 'px-2 py-1', lg: 'px-3 py-1.5' }[size];
  const chip = look === 'chip' ? `rounded border ${room} ${TONE_CHIP[entry.tone]}` : '';
  return (
    <span
      className={`inline-flex items-center align-middle font-bold whitespace-nowrap ${text} ${chip} ${TONE_TEXT[entry.tone]} ${className}`}
      title={wordHidden ? `${entry.word}: ${entry.meaning}` : entry.meaning}
    >
      <MarkGlyph
        mark={entry.mark}
        size={{ sm: 14, md: 16, lg: 22 }[size]}
        className="shrink-0"
        ground={
          look === 'chip'
            ? `var(--${entry.tone === 'ink' || entry.tone === 'soft' ? 'paper-sunk' : `${entry.tone}-wash`})`
            : undefined
        }
      />
      <span className={wordHidden ? 'sr-only' : undefined}>
        {entry.word}
        {detail ? <span className="font-normal"> {detail}</span> : null}
      </span>
    </span>
  );
}
