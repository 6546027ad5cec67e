import { closeDatabase } from '@/lib/database/connection';
import { env } from '@/lib/env';
import { seedReference } from './seed-reference';
import { withSeedLock } from './seed-lock';

/** Lays down the reference table and, with HEARTCUT_DEMO=1, the invented demo laboratory. Each part is done once. */
async function seed(): Promise<string[]> {
  const done: string[] = [];
  if ((await seedReference()) > 0) done.push('reference table');
  if (!env().demo) return done;
  // Loaded here, so that an installation without the demo never reads its code.
  const { seedDemo } = await import('./demo/seed-demo');
  if (await seedDemo()) done.push('demo laboratory');
  return done;
}

try {
  const started = performance.now();
  const done = await withSeedLock(seed);
  const seconds = ((performance.now() - started) / 1000).toFixed(1);
  console.log(
    done.length === 0 ? 'Everything is seeded already.' : `Seeded in ${seconds} s: ${done.join(', ')}.`,
  );
} finally {
  await closeDatabase();
}
