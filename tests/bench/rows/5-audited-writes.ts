import { recorded } from '@/lib/audit/recorded';
import { newId } from '@/lib/database/ids';
import { LogReading } from '@/lib/database/records';
import type { BenchRow } from '../bench-row';
import { compare } from '../measure';

const writers = 8;
const roundMs = 1_500;

/** Writes per second of so many writers, each beginning its next write when its last is durable. */
async function writesPerSecond(write: () => Promise<unknown>): Promise<number> {
  const started = performance.now();
  let written = 0;
  const work = async () => {
    while (performance.now() - started < roundMs) {
      await write();
      written += 1;
    }
  };
  await Promise.all(Array.from({ length: writers }, work));
  return (written * 1000) / (performance.now() - started);
}

export const row: BenchRow = {
  name: 'audited-writes',
  async measure(bench) {
    const { run, person, actor, group } = await bench.laboratory();
    const pool = bench.pool(writers);
    const reading = () => ({
      id: newId(),
      runId: run.id,
      at: new Date(),
      headTemperatureC: 77.1,
      sentById: person.id,
    });
    const audited = () =>
      recorded(actor, async ({ transaction, record }) => {
        const made = await LogReading.create({ ...reading(), sentByKind: 'user' }, { transaction });
        const after = { headTemperatureC: made.headTemperatureC };
        record({ type: 'readings.added', recordType: 'run', recordId: run.id, groupId: group.id, after });
      });
    const bare = () => {
      const { id, runId, at, headTemperatureC, sentById } = reading();
      return pool.query(
        `INSERT INTO log_readings (id, runId, at, headTemperatureC, sentByKind, sentById, createdAt)
         VALUES (?, ?, ?, ?, 'user', ?, ?)`,
        [id, runId, at, headTemperatureC, sentById, at],
      );
    };
    const result = await compare(
      () => writesPerSecond(audited),
      () => writesPerSecond(bare),
      { repetitions: 5 },
    );
    return [
      {
        what: `audited writes ÷ bare durable inserts, ${writers} writers`,
        measured: `${result.measured.toFixed(0)} /s`,
        baseline: `${result.baseline.toFixed(0)} /s`,
        ratio: result.ratio,
        spread: result.spread,
        note: `More is better here. One log reading a write, with its audit event in the same transaction or bare; ${result.repetitions} rounds of ${roundMs / 1000} s each.`,
      },
    ];
  },
};
