import type { FieldError } from '@/lib/errors';

/** Fields that people write in a box of several lines, where line breaks and tabs belong. */
const multiLineFields = new Set(['note', 'notes', 'comment', 'reason', 'remark', 'text', 'appearance']);

const named = (character: string) =>
  `U+${character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}`;

/** What is wrong with a text that may be stored and shown; null when nothing is. */
export function whyNotText(text: string, multiLine = false): string | null {
  if (/\p{Surrogate}/u.test(text))
    return 'This text holds half a character that no program can show. Delete it and type the text again.';
  // The control characters C0 and DEL of Unicode; they cannot be seen and break exports and logs.
  const control = (
    multiLine ? /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/ : /[\u0000-\u001f\u007f]/
  ).exec(text);
  if (control)
    return /[\t\n\r]/.test(control[0])
      ? 'This text takes one line. Take out line breaks and tabs.'
      : `This text holds an invisible control character (${named(control[0])}). Delete it and type the text again.`;
  // Embedding, override and isolate controls of Unicode Standard Annex 9: they make text read as what it is not.
  const direction = /[\u202a-\u202e\u2066-\u2069]/.exec(text);
  if (direction)
    return `This text holds an invisible mark that turns its direction of reading (${named(direction[0])}). Delete it and type the text again.`;
  return null;
}

/** Every text of a parsed JSON value that may not be stored, with its path; names of fields are looked at too. */
export function listForbiddenCharacters(json: unknown): FieldError[] {
  const errors: FieldError[] = [];
  // A list of what is still to be seen instead of recursion: a body may be nested deeper than the stack.
  const waiting: { value: unknown; path: string; multiLine: boolean }[] = [
    { value: json, path: '', multiLine: false },
  ];
  for (let next = waiting.pop(); next && errors.length < 20; next = waiting.pop()) {
    const { value, path, multiLine } = next;
    const below = (name: string) => (path ? `${path}.${name}` : name);
    if (typeof value === 'string') {
      const message = whyNotText(value, multiLine);
      if (message) errors.push({ path, message });
    } else if (Array.isArray(value)) {
      for (let at = value.length - 1; at >= 0; at--)
        waiting.push({ value: value[at], path: below(String(at)), multiLine });
    } else if (value && typeof value === 'object') {
      for (const [name, inner] of Object.entries(value).reverse()) {
        if (whyNotText(name)) errors.push({ path, message: `The name of a field here: ${whyNotText(name)}` });
        waiting.push({ value: inner, path: below(name), multiLine: multiLineFields.has(name) });
      }
    }
  }
  return errors;
}
