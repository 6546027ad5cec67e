import { isIP } from 'node:net';

/**
 * The caller's address. What a caller writes into X-Forwarded-For proves nothing, so without a proxy of ours the
 * socket counts. Behind `trustedProxies` of them, each of which appends the address that it saw, it is the entry
 * that the outermost one wrote: that many from the end. Anything that is no IP address falls back to the socket.
 */
export function clientAddress(
  socketAddress: string | undefined,
  forwarded: string | string[] | undefined,
  trustedProxies: number,
): string {
  const entries = (Array.isArray(forwarded) ? forwarded.join(',') : (forwarded ?? '')).split(',');
  const entry = trustedProxies > 0 ? (entries.at(-trustedProxies)?.trim() ?? '') : '';
  return isIP(entry) ? entry : (socketAddress ?? '');
}
