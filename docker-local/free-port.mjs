import { createServer } from 'node:net';

const MAX_PORTS_TRIED = 100;

/**
 * `wanted`, or the next port above it that nobody listens on at `host`.
 * @param {number} wanted
 * @param {string} host
 * @returns {Promise<number>}
 */
export async function chooseFreePort(wanted, host) {
  for (let port = wanted; port < wanted + MAX_PORTS_TRIED; port += 1) {
    const free = await new Promise((resolve, reject) => {
      const probe = createServer();
      probe.once('error', (/** @type {NodeJS.ErrnoException} */ error) =>
        error.code === 'EADDRINUSE' ? resolve(false) : reject(error),
      );
      probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
    });
    if (free) return port;
  }
  throw new Error(`No free port from ${wanted} to ${wanted + MAX_PORTS_TRIED - 1}. Set PORT to another one.`);
}

/** The port and host that the user asks for. */
export function readWantedAddress() {
  const port = Number(process.env.PORT || 3000);
  if (!Number.isInteger(port) || port < 1 || port > 65_435)
    throw new Error('PORT must be a whole number from 1 to 65435.');
  return { port, host: process.env.HOST || '127.0.0.1' };
}
