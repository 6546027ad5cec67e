import { describe, expect, it } from 'vitest';
import { clientAddress } from './client-address';

describe('the address of a caller', () => {
  it('is the socket’s, whatever the caller writes, when no proxy of ours stands before', () => {
    expect(clientAddress('127.0.0.1', '6.6.6.6', 0)).toBe('127.0.0.1');
    expect(clientAddress('127.0.0.1', undefined, 0)).toBe('127.0.0.1');
  });

  it('is what the outermost of our proxies saw, not what was sent to it', () => {
    expect(clientAddress('10.0.0.2', '6.6.6.6, 203.0.113.9', 1)).toBe('203.0.113.9');
    expect(clientAddress('10.0.0.2', '6.6.6.6, 203.0.113.9, 10.0.0.3', 2)).toBe('203.0.113.9');
  });

  it('falls back to the socket for what is no address, or when too few proxies spoke', () => {
    expect(clientAddress('10.0.0.2', 'x'.repeat(3000), 1)).toBe('10.0.0.2');
    expect(clientAddress('10.0.0.2', '203.0.113.9', 2)).toBe('10.0.0.2');
  });
});
