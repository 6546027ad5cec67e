import { closeDatabase } from '@/lib/database/connection';
import { env } from '@/lib/env';
import { seedReference } from './seed-reference';

/** Lays down the reference table and, with HEARTCUT_DEMO=1, the invented demo laboratory. Each part is done once. */
try {
  const started = performance.now();
  const batches = await seedReference();
  if (env().demo) {
    const { seedDemo } = await import('./demo/seed-demo');
    await seedDemo();
  }
  const seconds = ((performance.now() - started) / 1000).toFixed(1);
  console.log(batches === 0 ? `The reference table is in place (${seconds} s).` : `Seeded in ${seconds} s.`);
} finally {
  await closeDatabase();
}
