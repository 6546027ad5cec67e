import { describe, expect, it } from 'vitest';
import { readAddress, writeAddress } from './browse-filters-state';

describe('the filters in the address', () => {
  it('come back as they were written, without what is as by default', () => {
    const state = {
      filters: { compound: 'limonene', cut: 'heart', purityMin: '99' },
      sort: '-purity' as const,
    };
    const address = writeAddress(state);
    expect(address).toBe('compound=limonene&cut=heart&purityMin=99&sort=-purity');
    expect(readAddress(new URLSearchParams(address))).toEqual(state);
    expect(writeAddress({ filters: {}, sort: '-collectedAt' })).toBe('');
  });

  it('leave out what the API would refuse and ignore what is unknown', () => {
    const search = new URLSearchParams(
      'cut=middle&status=signed%20off&purityMin=many&page=3&sort=up&collectedFrom=soon',
    );
    expect(readAddress(search)).toEqual({ filters: { status: 'signed off' }, sort: '-collectedAt' });
  });
});
