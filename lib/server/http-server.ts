import { randomUUID } from 'node:crypto';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import next from 'next';
import { env } from '@/lib/env';
import { clientAddress } from './client-address';
import { refuseUnreadableAddress } from './refuse-unreadable-address';

export type HeartcutServer = {
  url: string;
  port: number;
  /** Stops taking requests, lets those under way finish for up to `graceMs`, then cuts the rest. */
  close(graceMs?: number): Promise<void>;
};

const requestIdPattern = /^[\w-]{8,64}$/;

function stop(server: Server, graceMs: number): Promise<void> {
  return new Promise((resolve) => {
    const cut = setTimeout(() => server.closeAllConnections(), graceMs);
    server.close(() => {
      clearTimeout(cut);
      resolve();
    });
    server.closeIdleConnections();
  });
}

/**
 * The app as one HTTP server. `port` 0 takes any free port. NEXTAUTH_URL is set from the address where
 * it was not given, since sign-in must know where it lives.
 */
export async function startHttpServer({
  port,
  host,
  dir,
  dev = false,
}: {
  port: number;
  host: string;
  dir: string;
  dev?: boolean;
}): Promise<HeartcutServer> {
  const app = next({ dev, dir, hostname: host, port });
  await app.prepare();
  const handle = app.getRequestHandler();
  const server = createServer((request, response) => {
    const given = request.headers['x-request-id'];
    const id = typeof given === 'string' && requestIdPattern.test(given) ? given : randomUUID();
    request.headers['x-request-id'] = id;
    request.headers['x-forwarded-for'] = clientAddress(
      request.socket.remoteAddress,
      request.headers['x-forwarded-for'],
      env().trustedProxies,
    );
    if (refuseUnreadableAddress(request.url ?? '/', id, response)) return;
    void handle(request, response);
  });
  // An upload from a slow bench network may take minutes; a silent one is cut.
  server.requestTimeout = 30 * 60_000;
  server.headersTimeout = 20_000;
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => resolve());
  });
  const taken = (server.address() as AddressInfo).port;
  return {
    port: taken,
    url: env().publicUrl,
    async close(graceMs = 10_000) {
      await stop(server, graceMs);
      await app.close();
    },
  };
}
