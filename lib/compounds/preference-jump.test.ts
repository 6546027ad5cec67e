import { describe, expect, it } from 'vitest';
import { preferenceJump } from './preference-jump';

describe('a new preferred value far from the old one (common practice)', () => {
  it.each([
    ['refractive index', 1.3723, 1.3743, 1.3744, '0.0021'],
    ['normal boiling point', 77.1, 79.1, 79.2, '2.1 °C'],
    ['density', 0.9, 0.92, 0.921, '0.021 g/mL'],
  ])('%s: from %s to %s is let through, to %s is asked about', (property, from, near, far, said) => {
    expect(preferenceJump(property, { value: from }, { value: near })).toBeNull();
    expect(preferenceJump(property, { value: from }, { value: far })).toContain(said);
  });
  it('does not watch what is no number or has no usual spread', () => {
    expect(preferenceJump('flash point', { value: 10 }, { value: 90 })).toBeNull();
    expect(preferenceJump('refractive index', { value: null }, { value: 1.5 })).toBeNull();
  });
});
