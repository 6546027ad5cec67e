/**
 * Every state word of the product, with its mark and its tone, in one table. The marks are drawn on a 16 x 16 grid from
 * four ideas: a receiver (where a fraction stands), a drop (what a test says), an eye (what a test can see) and the cut
 * strip itself (which cut it is). Plain data, so that pages, charts and documents draw the same mark.
 */
export type Tone = 'glass' | 'ink' | 'soft' | 'needs' | 'fails';

/** One stroke of a mark. `filled`: painted; `cut`: drawn in the colour of the ground; `dashed`: a broken line. */
export type MarkStroke = { d: string; filled?: boolean; cut?: boolean; dashed?: boolean };

export type StateEntry = { word: string; tone: Tone; meaning: string; mark: readonly MarkStroke[] };

const FLASK = 'M6 2.5v3.6a4.2 4.2 0 1 0 4 0V2.5';
const FLASK_FILL = 'M3.9 9.9h8.2a4.2 4.2 0 0 1-8.2 0Z';
const DROP = 'M8 1.5c2.3 2.9 4.4 5.2 4.4 7.9a4.4 4.4 0 0 1-8.8 0C3.6 6.7 5.7 4.4 8 1.5Z';
const STRIP = 'M1.5 4.5h13v7h-13Z';

export const STATES = {
  // Fraction status
  open: {
    word: 'open',
    tone: 'ink',
    meaning: 'still being collected or documented',
    mark: [{ d: FLASK }, { d: 'M5 2.5h-.7M11 2.5h.7' }],
  },
  submitted: {
    word: 'submitted',
    tone: 'ink',
    meaning: 'waits in the sign-off queue',
    mark: [{ d: FLASK }, { d: FLASK_FILL, filled: true }, { d: 'M4.8 1.8h6.4' }],
  },
  returned: {
    word: 'returned',
    tone: 'needs',
    meaning: 'came back with a reason',
    mark: [{ d: 'M3 7.2h7.3a3 3 0 0 1 0 6H7' }, { d: 'M6 3.7 2.6 7.2 6 10.7' }],
  },
  signed_off: {
    word: 'signed off',
    tone: 'glass',
    meaning: 'a person has signed for it',
    mark: [
      {
        d: 'M1.8 10.5c2-5.5 4.6-8.7 5.6-7.6 1.1 1.2-2.9 6-2 7.1.9 1 2.5-3 3.5-2.6.9.4-.6 2.6.5 2.8 1 .2 1.7-1.6 4.6-1.7',
      },
      { d: 'M1.8 13.8h12.4' },
    ],
  },
  reopened: {
    word: 'reopened',
    tone: 'needs',
    meaning: 'opened again with a reason; its signature no longer holds',
    mark: [
      { d: 'M6 4.5v1.6a4.2 4.2 0 1 0 4 0V4.5' },
      { d: FLASK_FILL, filled: true },
      { d: 'm9.3 2.7 4-1.5' },
    ],
  },
  // Verdicts and criteria
  pass: {
    word: 'pass',
    tone: 'glass',
    meaning: 'within its limit, with the uncertainty',
    mark: [
      { d: DROP, filled: true },
      { d: 'm5.8 9.3 1.7 1.8 2.9-3.6', cut: true },
    ],
  },
  fail: {
    word: 'fail',
    tone: 'fails',
    meaning: 'outside its limit',
    mark: [{ d: DROP }, { d: 'm2 3.6 12 10.8' }, { d: 'M14 3.6 2 14.4' }],
  },
  inconclusive: {
    word: 'inconclusive',
    tone: 'needs',
    meaning: 'the limit lies inside the uncertainty',
    mark: [{ d: DROP }, { d: 'M8 1.5c-2.3 2.9-4.4 5.2-4.4 7.9A4.4 4.4 0 0 0 8 13.8Z', filled: true }],
  },
  blind: {
    word: 'blind',
    tone: 'needs',
    meaning: 'no test that was done can see it',
    mark: [
      { d: 'M1.5 6.5c1.8 2.7 4 4 6.5 4s4.7-1.3 6.5-4' },
      { d: 'M8 10.7v2.8M4.3 9.8l-1.2 2.4M11.7 9.8l1.2 2.4' },
    ],
  },
  incomplete: {
    word: 'incomplete',
    tone: 'needs',
    meaning: 'evidence that the specification asks for is not there yet',
    mark: [{ d: 'M2.5 3.5h11M2.5 8h11' }, { d: 'M2.5 12.5h11', dashed: true }],
  },
  missing: {
    word: 'missing',
    tone: 'needs',
    meaning: 'asked for and not there',
    mark: [{ d: DROP, dashed: true }],
  },
  // Coverage of a test
  sees: {
    word: 'sees',
    tone: 'glass',
    meaning: 'this test shows it, down to the stated amount',
    mark: [
      { d: 'M1.5 8c1.8-2.7 4-4 6.5-4s4.7 1.3 6.5 4c-1.8 2.7-4 4-6.5 4s-4.7-1.3-6.5-4Z' },
      { d: 'M8 6a2 2 0 1 1 0 4 2 2 0 0 1 0-4Z', filled: true },
    ],
  },
  not_done: { word: 'not done', tone: 'soft', meaning: 'the test was not made', mark: [{ d: 'M4.5 8h7' }] },
  // Cuts
  fore_run: {
    word: 'fore-run',
    tone: 'ink',
    meaning: 'what came over before the heart',
    mark: [{ d: STRIP }, { d: 'M1.5 4.5h4v7h-4Z', filled: true }],
  },
  heart: {
    word: 'heart',
    tone: 'glass',
    meaning: 'the cut that is wanted',
    mark: [{ d: STRIP }, { d: 'M5.5 4.5h5v7h-5Z', filled: true }],
  },
  tail: {
    word: 'tail',
    tone: 'ink',
    meaning: 'what came over after the heart',
    mark: [{ d: STRIP }, { d: 'M10.5 4.5h4v7h-4Z', filled: true }],
  },
  residue: {
    word: 'residue',
    tone: 'ink',
    meaning: 'what stayed in the still',
    mark: [{ d: 'M6.5 1.8v3a5 5 0 1 0 3 0v-3' }, { d: 'M4.2 12.2h7.6a5 5 0 0 1-7.6 0Z', filled: true }],
  },
  trap: {
    word: 'trap',
    tone: 'ink',
    meaning: 'what the cold trap caught',
    mark: [{ d: 'M3.5 2v8.5a4.5 4.5 0 0 0 9 0V2' }, { d: 'M8 1.5v8' }, { d: 'M8 11.8v1' }],
  },
} as const satisfies Record<string, StateEntry>;

export type StateCode = keyof typeof STATES;
export const FRACTION_STATUSES = ['open', 'submitted', 'returned', 'signed_off', 'reopened'] as const;
export const VERDICTS = ['pass', 'fail', 'inconclusive', 'blind', 'incomplete'] as const;
export const CRITERION_STATES = ['pass', 'fail', 'inconclusive', 'blind', 'missing'] as const;
export const COVERAGE_STATES = ['sees', 'blind', 'not_done'] as const;
export const CUTS = ['fore_run', 'heart', 'tail', 'residue', 'trap'] as const;

/** The entry of a state however its word is joined: `signed_off`, `signed-off`, `signed off`, `signedOff`; null if unknown. */
export function findState(state: string): StateEntry | null {
  const code = state
    .replace(/([a-z])([A-Z])/g, '$1_$2')
    .toLowerCase()
    .replace(/[\s-]+/g, '_');
  return Object.hasOwn(STATES, code) ? STATES[code as StateCode] : null;
}
