import { describe, expect, it } from 'vitest';
import {
  COVERAGE_STATES,
  CRITERION_STATES,
  CUTS,
  FRACTION_STATUSES,
  STATES,
  VERDICTS,
  findState,
} from './marks';

const entries = Object.entries(STATES);
const all = [...FRACTION_STATUSES, ...VERDICTS, ...CRITERION_STATES, ...COVERAGE_STATES, ...CUTS];

describe('the table of states', () => {
  it('holds exactly the states that the lists name', () => {
    expect(new Set(entries.map(([code]) => code))).toEqual(new Set(all));
  });

  it('gives every state a word and a mark that no other state has', () => {
    expect(new Set(entries.map(([, e]) => e.word)).size).toBe(entries.length);
    expect(new Set(entries.map(([, e]) => JSON.stringify(e.mark))).size).toBe(entries.length);
  });

  it('keeps brick red for what fails and teal away from what needs a person', () => {
    expect(entries.filter(([, e]) => e.tone === 'fails').map(([code]) => code)).toEqual(['fail']);
    for (const code of ['returned', 'reopened', 'inconclusive', 'blind', 'incomplete', 'missing'] as const) {
      expect(STATES[code].tone).toBe('needs');
    }
  });

  it('finds a state however its word is joined, and nothing for a word that is not a state', () => {
    for (const spelling of ['signed_off', 'signed-off', 'signed off', 'signedOff', 'Signed off']) {
      expect(findState(spelling)?.word).toBe('signed off');
    }
    expect(findState('released')).toBeNull();
    expect(findState('constructor')).toBeNull();
  });
});
