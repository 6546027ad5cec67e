import { expect, it } from 'vitest';
import { requireIfMatch } from './version';

const withTag = (tag?: string) =>
  new Request('http://localhost/', tag === undefined ? {} : { headers: { 'if-match': tag } });

it('reads one strong tag', () => {
  expect(requireIfMatch(withTag('"6"'))).toBe(6);
});

it('refuses a weak tag, a list and a star, and asks for one where there is none (RFC 9110, 13.1.1)', () => {
  for (const tag of ['W/"6"', '"6", "7"', '*', '6', ''])
    expect(() => requireIfMatch(withTag(tag))).toThrow(
      tag === '' ? 'version-required' : 'precondition-failed',
    );
  expect(() => requireIfMatch(withTag())).toThrow('version-required');
});
