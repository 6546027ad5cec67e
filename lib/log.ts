import pino from 'pino';
import { env } from './env';

const store = globalThis as { heartcutLog?: pino.Logger };

/** Structured log on standard output. Secrets are cut out by path before anything is written. */
export function log(): pino.Logger {
  store.heartcutLog ??= pino({
    level: env().logLevel,
    base: { app: 'heartcut' },
    redact: [
      'password',
      '*.password',
      'authorization',
      '*.authorization',
      'cookie',
      '*.cookie',
      'token',
      '*.token',
    ],
    timestamp: pino.stdTimeFunctions.isoTime,
  });
  return store.heartcutLog;
}
