import { describe, expect, it } from 'vitest';
import { changedFields } from './changed-fields';

describe('what an edit changed', () => {
  it('is nothing when the same values are sent again', () => {
    const at = new Date('2026-11-02T09:30:00Z');
    const present = { tareMassG: 50, note: null, startedAt: at, safetyChecks: { pathOpen: true } };
    expect(changedFields(present, { ...present, startedAt: new Date(at) })).toEqual({
      before: {},
      after: {},
    });
  });

  it('holds the old and the new value of each field that differs, and an emptied field as null', () => {
    expect(changedFields({ cut: 'heart', tareMassG: 50 }, { cut: 'tail', tareMassG: null })).toEqual({
      before: { cut: 'heart', tareMassG: 50 },
      after: { cut: 'tail', tareMassG: null },
    });
  });

  it('leaves out what was not sent', () => {
    expect(changedFields({ cut: 'heart' }, { cut: undefined })).toEqual({ before: {}, after: {} });
  });
});
