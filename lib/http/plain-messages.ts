import { z } from 'zod';

const kinds: Record<string, string> = {
  string: 'a text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
  object: 'an object in braces, with its fields by name',
  record: 'an object in braces, with its fields by name',
  array: 'a list in square brackets',
  tuple: 'a list in square brackets',
  null: 'null',
  undefined: 'nothing: leave it out',
  date: 'a date',
};

const formats: Record<string, string> = {
  email: 'Give an e-mail address, for example name@example.org.',
  url: 'Give a complete address that begins with https://.',
  datetime: 'Give the time as ISO 8601 with its offset, for example 2026-11-02T09:30:00Z.',
  date: 'Give a day, for example 2026-11-02.',
  time: 'Give a time of day, for example 09:30.',
  uuid: 'Give the id as it stands in the record.',
};

/** "at least 3" of what, by the kind of value that is too small or too large. */
function counted(origin: string, count: number | bigint): string {
  const plural = Number(count) === 1 ? '' : 's';
  if (origin === 'string') return `${count} character${plural}`;
  if (origin === 'array' || origin === 'set') return `${count} ${Number(count) === 1 ? 'entry' : 'entries'}`;
  return String(count);
}

/**
 * What to do about a value that a schema refuses, in plain words; undefined leaves it to the schema's own.
 * A message that a schema gives itself goes before these.
 */
function plainMessage(issue: z.core.$ZodRawIssue): string | undefined {
  switch (issue.code) {
    case 'invalid_type':
      if (issue.input === undefined) return 'This is missing. Fill it in.';
      return `Give ${kinds[issue.expected] ?? 'a value of the right kind'}.`;
    case 'too_small':
      if (issue.origin === 'string' && Number(issue.minimum) === 1) return 'Fill this in.';
      if (issue.origin === 'string' || issue.origin === 'array' || issue.origin === 'set')
        return `Give at least ${counted(issue.origin, issue.minimum)}.`;
      return issue.inclusive
        ? `Give a number that is ${issue.minimum} or more.`
        : `Give a number above ${issue.minimum}.`;
    case 'too_big':
      if (issue.origin === 'string' || issue.origin === 'array' || issue.origin === 'set')
        return `Give at most ${counted(issue.origin, issue.maximum)}.`;
      return issue.inclusive
        ? `Give a number that is ${issue.maximum} or less.`
        : `Give a number below ${issue.maximum}.`;
    case 'unrecognized_keys':
      return `There is no field ${issue.keys.map((key) => `"${key}"`).join(', ')} here. Take it out, or check how it is spelt.`;
    case 'invalid_value':
      return issue.values.length === 1
        ? `Only ${String(issue.values[0])} is possible here.`
        : `Choose one of: ${issue.values.map(String).join(', ')}.`;
    case 'invalid_format':
      return (
        formats[issue.format] ?? 'This is not written as it should be. Check it against the documentation.'
      );
    case 'not_multiple_of':
      return `Give a multiple of ${issue.divisor}.`;
    case 'invalid_union':
      return 'This has none of the forms that are possible here. Check it against the documentation.';
    default:
      return 'This value is not possible here. Check it against the documentation.';
  }
}

// For every schema of the program, on the server and in the browser.
z.config({ customError: plainMessage });
