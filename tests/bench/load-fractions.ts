import { randomBytes } from 'node:crypto';
import type { Connection } from 'mariadb';
import { newId } from '@/lib/database/ids';

const fractionsARun = 8;
/** Rows sent at once: well under max_allowed_packet, and memory does not depend on the count. */
const runsABatch = 250;
const cuts = ['fore-run', 'heart', 'heart', 'heart', 'heart', 'tail', 'residue', 'trap'] as const;
const statuses = ['open', 'submitted', 'returned', 'signed off', 'signed off', 'signed off'] as const;
const verdicts = ['pass', 'pass', 'fail', 'inconclusive', 'blind', 'incomplete'] as const;
const oldest = Date.UTC(2016, 0, 4, 8);

type Row = (string | number | Date | null)[];

const runColumns = [
  'id',
  'code',
  'groupId',
  'chemistId',
  'targetCompoundId',
  'technique',
  'chargeMassG',
  'chargeSource',
  'safetyChecks',
  'startedAt',
  'nextFractionNumber',
  'createdAt',
  'updatedAt',
];
const fractionColumns = [
  'id',
  'code',
  'runId',
  'groupId',
  'compoundId',
  'number',
  'cut',
  'collectedById',
  'collectedAt',
  'tareMassG',
  'grossMassG',
  'appearance',
  'storagePlace',
  'status',
  'verdictState',
  'purityPercent',
  'createdAt',
  'updatedAt',
];

/** The next of a repeatable row of numbers from 0 to 1 (linear congruential; constants of Numerical Recipes). */
function repeatable(seed: number): () => number {
  let state = seed >>> 0;
  return () => (state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0) / 2 ** 32;
}

function insert(connection: Connection, table: string, columns: string[], rows: Row[]) {
  const marks = `(${columns.map(() => '?').join(', ')})`;
  const sql = `INSERT INTO ${table} (${columns.join(', ')}) VALUES ${rows.map(() => marks).join(', ')}`;
  return connection.query(sql, rows.flat());
}

/**
 * Fills a group with `count` invented fractions in runs of eight, spread over ten years, every compound in turn.
 * For a database that is thrown away: rows go in by the bare connector and leave no audit events. 1 000 000 fit,
 * since a batch is sent before the next is made. Returns how many fractions were written.
 */
export async function loadFractions(
  connection: Connection,
  {
    count,
    groupId,
    chemistId,
    seed = 1,
  }: { count: number; groupId: string; chemistId: string; seed?: number },
): Promise<number> {
  const random = repeatable(seed);
  const pick = <T>(values: readonly T[]): T => values[Math.floor(random() * values.length)]!;
  const compounds = await connection.query<{ id: string }[]>('SELECT id FROM compounds');
  const prefix = `B-${randomBytes(3).toString('hex')}`;
  const runCount = Math.ceil(count / fractionsARun);
  const stepMs = Math.floor((Date.now() - oldest) / runCount);
  let written = 0;
  for (let first = 0; first < runCount; first += runsABatch) {
    const runs: Row[] = [];
    const fractions: Row[] = [];
    for (let index = first; index < Math.min(runCount, first + runsABatch); index += 1) {
      const [id, code] = [newId(), `${prefix}-${index + 1}`];
      const startedAt = new Date(oldest + index * stepMs);
      const compoundId = compounds[index % compounds.length]!.id;
      const size = Math.min(fractionsARun, count - index * fractionsARun);
      runs.push([
        id,
        code,
        groupId,
        chemistId,
        compoundId,
        'fractional',
        250,
        'invented',
        '{}',
        startedAt,
        size + 1,
        startedAt,
        startedAt,
      ]);
      for (let number = 1; number <= size; number += 1) {
        const at = new Date(startedAt.getTime() + number * 900_000);
        const verdict = pick(verdicts);
        const purity = verdict === 'incomplete' ? null : Math.round((94 + 6 * random()) * 100) / 100;
        const masses = [40 + 20 * random(), 70 + 60 * random()].map((grams) => Math.round(grams * 100) / 100);
        const words = [
          pick(['clear, colourless', 'faintly yellow', 'cloudy']),
          `cupboard ${pick([1, 2, 3, 4])}`,
        ];
        fractions.push([
          ...[
            newId(),
            `${code}-F${number}`,
            id,
            groupId,
            compoundId,
            number,
            cuts[number - 1]!,
            chemistId,
            at,
          ],
          ...[...masses, ...words, pick(statuses), verdict, purity, at, at],
        ]);
      }
    }
    await connection.beginTransaction();
    await insert(connection, 'runs', runColumns, runs);
    await insert(connection, 'fractions', fractionColumns, fractions);
    await connection.commit();
    written += fractions.length;
  }
  // Otherwise the planner works with the statistics of an empty table for a while.
  await connection.query('ANALYZE TABLE runs, fractions');
  return written;
}
