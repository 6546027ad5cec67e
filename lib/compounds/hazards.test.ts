import { expect, it } from 'vitest';
import { isPeroxideClass, PEROXIDE_CLASSES, peroxideAdvice } from './hazards';

it('tells to test before distilling and never to distil a class B liquid to dryness', () => {
  const { advice, word } = peroxideAdvice('B');
  expect(word).toContain('peroxides');
  expect(advice).toContain('Test before distilling');
  expect(advice).toContain('never distil to dryness');
});

it('gives each class its own word, its source, and leaves the judgement to trained staff', () => {
  const given = PEROXIDE_CLASSES.map(peroxideAdvice);
  expect(new Set(given.map(({ word }) => word)).size).toBe(3);
  for (const { advice, source } of given) {
    expect(advice).toContain('judgement of trained staff');
    expect(source).toContain('Kelly');
  }
});

it('knows the three letters and nothing else', () => {
  expect(['A', 'B', 'C'].every(isPeroxideClass)).toBe(true);
  expect(isPeroxideClass('D')).toBe(false);
  expect(isPeroxideClass('')).toBe(false);
});
