import { expect, it } from 'vitest';
import { z } from 'zod';
import './plain-messages';

const messageOf = (schema: z.ZodType, value: unknown) => schema.safeParse(value).error?.issues[0]?.message;

it('says what is expected instead of naming types of the program', () => {
  expect(messageOf(z.strictObject({}), null)).toBe('Give an object in braces, with its fields by name.');
  expect(messageOf(z.strictObject({}), { extra: 1 })).toContain('There is no field "extra" here.');
  expect(messageOf(z.number().min(1), 0)).toBe('Give a number that is 1 or more.');
  expect(messageOf(z.number().positive(), 0)).toBe('Give a number above 0.');
  expect(messageOf(z.number().max(5), 6)).toBe('Give a number that is 5 or less.');
  expect(messageOf(z.number().int(), 1.5)).toBe('Give a whole number.');
  expect(messageOf(z.coerce.number(), 'abc')).toBe('Give a number.');
  expect(messageOf(z.string(), undefined)).toBe('This is missing. Fill it in.');
  expect(messageOf(z.string().min(1), '')).toBe('Fill this in.');
  expect(messageOf(z.string().max(3), 'four')).toBe('Give at most 3 characters.');
  expect(messageOf(z.array(z.number()).min(1), [])).toBe('Give at least 1 entry.');
  expect(messageOf(z.enum(['heart', 'tail']), 'head')).toBe('Choose one of: heart, tail.');
  expect(messageOf(z.email(), 'nobody')).toContain('name@example.org');
});

it('keeps the message that a schema gives itself', () => {
  expect(messageOf(z.number().min(0, 'A mass is not negative.'), -1)).toBe('A mass is not negative.');
  expect(
    messageOf(
      z.object({}).refine(() => false, 'Send a field.'),
      {},
    ),
  ).toBe('Send a field.');
});
