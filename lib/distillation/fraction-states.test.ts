import { expect, it } from 'vitest';
import { whyNotInState } from './fraction-states';

it('says in a sentence in which states something can be done', () => {
  expect(whyNotInState('submit', 'signed off')).toBe(
    'The fraction is signed off; it can be submitted only when it is open, returned or reopened.',
  );
  expect(whyNotInState('share', 'open')).toBe(
    'The fraction is open; it can be shared only when it is signed off.',
  );
  expect(whyNotInState('submit', 'open')).toBeNull();
});
