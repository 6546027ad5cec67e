import { expect, it } from 'vitest';
import { listForbiddenCharacters, whyNotText } from './forbidden-characters';

it('names each field whose text holds half a character, a control character or a turn of direction', () => {
  const body = {
    good: 'Ölbad 180 °C, 日本語, 👩‍🔬, עברית',
    half: '\ud800x',
    list: [{ source: 'a\u0007b' }, { source: 'a\u202eb' }, { source: 'a\u2066b' }, { source: 'a\u007f' }],
  };
  const found = listForbiddenCharacters(body);
  expect(found.map((one) => one.path)).toEqual([
    'half',
    'list.0.source',
    'list.1.source',
    'list.2.source',
    'list.3.source',
  ]);
  expect(found[1]!.message).toContain('U+0007');
  expect(found[2]!.message).toContain('U+202E');
});

it('lets line breaks and tabs stand where several lines are written, and nowhere else', () => {
  expect(listForbiddenCharacters({ note: 'one\n\ttwo\r\n', name: 'one line' })).toEqual([]);
  expect(listForbiddenCharacters({ name: 'one\ntwo' })).toMatchObject([{ path: 'name' }]);
  expect(listForbiddenCharacters({ note: 'one\u0000' })).toMatchObject([{ path: 'note' }]);
});

it('looks at names of fields and at a body that is one text, however deep it is nested', () => {
  expect(listForbiddenCharacters({ 'a\u0000': 1 })).toHaveLength(1);
  expect(listForbiddenCharacters('\udfff')).toHaveLength(1);
  let deep: unknown = '\ud800';
  for (let level = 0; level < 50_000; level++) deep = [deep];
  expect(listForbiddenCharacters(deep)).toHaveLength(1);
  expect(whyNotText('as it should be')).toBeNull();
});
