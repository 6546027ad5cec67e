import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { FractionRow } from '@/lib/distillation/fraction-schema';
import { benchOfOne, grantRole, personIn } from '../factories/bench';
import { buildCompound, buildFraction, buildGroup, buildRun, buildToken } from '../factories/records';
import { anonymous, stopTestServer, unique, withToken } from '../support/test-server';

afterAll(stopTestServer);

type Bench = Awaited<ReturnType<typeof benchOfOne>>;
let bench: Bench;
let other: Awaited<ReturnType<typeof buildGroup>>;
let terpene: Awaited<ReturnType<typeof buildCompound>>;
let runCode: string;

const day = (date: number, hour = 12) => new Date(Date.UTC(2026, 5, date, hour));
const codes = (rows: FractionRow[]) => rows.map((row) => row.code.slice(row.code.lastIndexOf('-')));

async function get(query: Record<string, string | number>, agent = bench.agent) {
  const { body } = await agent.get('/api/v1/fractions').query(query).expect(200);
  return body as { items: FractionRow[]; nextCursor: string | null };
}

async function walk(query: Record<string, string | number>): Promise<FractionRow[]> {
  const rows: FractionRow[] = [];
  let cursor: string | null = null;
  do {
    const page: { items: FractionRow[]; nextCursor: string | null } = await get({
      ...query,
      limit: 2,
      ...(cursor && { cursor }),
    });
    rows.push(...page.items);
    cursor = page.nextCursor;
  } while (cursor);
  return rows;
}

beforeAll(async () => {
  bench = await benchOfOne();
  terpene = await buildCompound({ name: unique('terpenoid_invented') });
  other = await buildGroup();
  await grantRole(bench.user, other, 'pi');
  const run = await buildRun({ group: bench.group, chemist: bench.user, target: bench.target });
  runCode = run.code;
  await buildFraction({
    run,
    cut: 'fore-run',
    collectedAt: day(1),
    purityPercent: 71.5,
    verdictState: 'fail',
  });
  await buildFraction({
    run,
    collectedAt: day(2),
    purityPercent: 99.1,
    status: 'signed off',
    verdictState: 'pass',
  });
  await buildFraction({ run, collectedAt: day(2), purityPercent: 99.1, storagePlace: 'fridge 100%' });
  await buildFraction({ run, cut: 'tail', collectedAt: day(3) });
  const elsewhere = await buildRun({ group: other, target: terpene });
  await buildFraction({ run: elsewhere, collectedAt: day(2, 18), purityPercent: 88 });
  await buildFraction();
});

describe('browsing fractions', () => {
  it('shows those of all the caller’s groups, the latest first, each once, page by page', async () => {
    const rows = await walk({});
    expect(rows.map((row) => row.collectedAt.slice(8, 13))).toEqual([
      '03T12',
      '02T18',
      '02T12',
      '02T12',
      '01T12',
    ]);
    expect(new Set(rows.map((row) => row.id)).size).toBe(5);
    expect(rows[0]).toMatchObject({
      code: `${runCode}-F4`,
      run: runCode,
      compound: { id: bench.target.id, name: bench.target.name, cas: null },
      cut: 'tail',
      netMassG: 42.5,
      status: 'open',
      verdict: 'incomplete',
      purityPercent: null,
      collectedBy: bench.user.name,
      group: { id: bench.group.id, name: bench.group.name },
    });
  });

  it('sorts by falling purity, those without one last', async () => {
    const rows = await walk({ sort: '-purity' });
    expect(rows.map((row) => row.purityPercent)).toEqual([99.1, 99.1, 88, 71.5, null]);
    expect(new Set(rows.map((row) => row.id)).size).toBe(5);
  });

  it('sorts by code', async () => {
    const rows = await walk({ sort: 'code', run: runCode });
    expect(codes(rows)).toEqual(['-F1', '-F2', '-F3', '-F4']);
  });

  it('puts the tenth fraction after the ninth', async () => {
    const run = await buildRun({ group: other, nextFractionNumber: 9 });
    for (let at = 0; at < 3; at++) await buildFraction({ run, cut: 'trap', collectedAt: day(1) });
    const rows = await walk({ sort: 'code', run: run.code });
    expect(codes(rows)).toEqual(['-F9', '-F10', '-F11']);
  });

  it('filters by compound: id, part of a name, and nothing for what is unknown', async () => {
    expect((await get({ compound: terpene.id })).items).toHaveLength(1);
    expect((await get({ compound: terpene.name.slice(0, -2) })).items).toHaveLength(1);
    expect((await get({ compound: bench.target.id })).items).toHaveLength(4);
    expect((await get({ compound: 'no such thing' })).items).toEqual([]);
    expect((await get({ compound: '141-78-7' })).items).toEqual([]);
  });

  it('filters by cut, status, verdict, purity, run and group, also together', async () => {
    expect(codes((await get({ cut: 'fore-run' })).items)).toEqual(['-F1']);
    expect(codes((await get({ status: 'signed off' })).items)).toEqual(['-F2']);
    expect(codes((await get({ verdict: 'fail' })).items)).toEqual(['-F1']);
    expect((await get({ purityMin: 88 })).items).toHaveLength(3);
    expect((await get({ run: runCode })).items).toHaveLength(4);
    expect((await get({ group: other.id, compound: terpene.id })).items).toHaveLength(1);
    expect(
      (await get({ run: runCode, cut: 'heart', purityMin: 99, verdict: 'incomplete' })).items,
    ).toHaveLength(1);
  });

  it('counts a day to its end and a time to its moment', async () => {
    const within = async (query: object) => (await get({ run: runCode, ...query })).items.length;
    expect(await within({ collectedFrom: '2026-06-02', collectedTo: '2026-06-02' })).toBe(2);
    expect(await within({ collectedTo: '2026-06-02T12:00:00Z' })).toBe(3);
    expect(await within({ collectedTo: '2026-06-02T11:59:59Z' })).toBe(1);
    expect(await within({ collectedFrom: '2026-06-02T14:00:00+02:00' })).toBe(3);
    expect(await within({ collectedFrom: '2026-06-02T14:00:01+02:00' })).toBe(1);
  });

  it('searches codes, compounds and storage places, with LIKE signs taken as they are', async () => {
    expect((await get({ q: `${runCode}-F3` })).items).toHaveLength(1);
    expect((await get({ q: '100%' })).items).toHaveLength(1);
    expect((await get({ q: 'terpenoid_inv' })).items).toHaveLength(1);
  });

  it('never shows another group, not even when it is named', async () => {
    const stranger = await personIn(await buildGroup(), ['pi']);
    expect((await get({}, stranger.agent)).items).toEqual([]);
    expect((await get({ group: bench.group.id }, stranger.agent)).items).toEqual([]);
    expect((await get({ run: runCode }, stranger.agent)).items).toEqual([]);
  });

  it('answers 400 to unknown parameters, wrong values and a cursor of another order', async () => {
    const ask = (query: object) => bench.agent.get('/api/v1/fractions').query(query);
    await ask({ offset: 10 }).expect(400);
    await ask({ cut: 'middle' }).expect(400);
    await ask({ sort: 'purity' }).expect(400);
    await ask({ purityMin: 101 }).expect(400);
    await ask({ collectedFrom: '02.06.2026' }).expect(400);
    const { nextCursor } = await get({ limit: 2 });
    await ask({ cursor: nextCursor, sort: '-purity' }).expect(400);
  });

  it('is for signed-in people', async () => {
    await (await anonymous()).get('/api/v1/fractions').expect(401);
    const { token } = await buildToken({ group: bench.group });
    await (await withToken(token)).get('/api/v1/fractions').expect(403);
  });
});
