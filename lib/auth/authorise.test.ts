import { describe, expect, it } from 'vitest';
import { whyNot } from './authorise';

const visitor = {
  kind: 'user',
  id: 'u',
  name: 'Somebody',
  isAdmin: false,
  mustChangePassword: false,
  memberships: [],
} as unknown as Parameters<typeof whyNot>[0];

describe('why somebody may not do something', () => {
  it('names the group of the record where only its roles count', () => {
    expect(whyNot(visitor, 'run.write', 'g')).toBe('Only a chemist of this group can do this.');
    expect(whyNot(visitor, 'fraction.signOff', 'g')).toBe(
      'Only an analyst or a PI of this group can do this.',
    );
  });

  it('says any group for what all groups share', () => {
    expect(whyNot(visitor, 'compound.write', null)).toBe('Only a PI of any group can do this.');
  });

  it('names administrators apart from groups', () => {
    expect(whyNot(visitor, 'audit.read', 'g')).toBe(
      'Only a PI of this group, or an administrator can do this.',
    );
    expect(whyNot(visitor, 'administration.write', null)).toBe('Only an administrator can do this.');
  });
});
