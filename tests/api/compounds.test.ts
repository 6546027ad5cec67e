import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { seedReference } from '@/seeders/seed-reference';
import { buildCompound, buildGroup, buildToken, buildUser } from '../factories/records';
import { type Agent, anonymous, signedIn, stopTestServer, unique, withToken } from '../support/test-server';

afterAll(stopTestServer);

let pi: Agent;
let chemist: Agent;

async function agentWith(role: 'pi' | 'chemist'): Promise<Agent> {
  const user = await buildUser({ group: await buildGroup(), roles: [role] });
  return signedIn({ email: user.email, password: user.plainPassword });
}

beforeAll(async () => {
  await seedReference();
  pi = await agentWith('pi');
  chemist = await agentWith('chemist');
});

async function namesFound(q: string): Promise<string[]> {
  const { body } = await chemist.get('/api/v1/compounds').query({ q }).expect(200);
  return body.items.map(({ name }: { name: string }) => name);
}

describe('finding compounds', () => {
  it.each([
    ['108-94-1', 'cyclohexanone'],
    ['108941', 'cyclohexanone'],
    ['cyclohexanone', 'cyclohexanone'],
    ['CYCLOHEXANONE', 'cyclohexanone'],
    ['DMSO', 'dimethyl sulfoxide'],
  ])('finds by %s', async (q, expected) => {
    expect((await namesFound(q))[0]).toBe(expected);
  });

  it('finds isomers by their formula, in whatever order it is typed', async () => {
    expect(await namesFound('h16c10')).toEqual(expect.arrayContaining(['alpha-pinene', 'myrcene']));
  });

  it('puts names that begin with the text before names that hold it', async () => {
    const found = await namesFound('butan');
    const begins = found.map((name) => name.startsWith('butan'));
    expect(begins).toContain(true);
    expect(found.length).toBeGreaterThan(begins.filter(Boolean).length);
  });

  it('takes a per cent sign as a sign and not as a wildcard', async () => {
    expect(await namesFound('%')).toEqual([]);
    expect(await namesFound("'; DROP TABLE compounds; --")).toEqual([]);
  });

  it('walks through all compounds by the cursor, each once', async () => {
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const query: Record<string, string> = { limit: '60', ...(cursor && { cursor }) };
      const { body } = await chemist.get('/api/v1/compounds').query(query).expect(200);
      seen.push(...body.items.map(({ id }: { id: string }) => id));
      cursor = body.nextCursor;
    } while (cursor);
    expect(new Set(seen).size).toBe(seen.length);
    expect(seen.length).toBeGreaterThanOrEqual(207);
  });

  it('refuses a foreign cursor, an unknown parameter and nobody', async () => {
    await chemist.get('/api/v1/compounds?cursor=abc').expect(400);
    await chemist.get('/api/v1/compounds?page=2').expect(400);
    await (await anonymous()).get('/api/v1/compounds').expect(401);
  });

  it('gives each its boiling point with pressure and source', async () => {
    const { body } = await chemist.get('/api/v1/compounds?q=141-78-6').expect(200);
    expect(body.items[0].cas).toBe('141-78-6');
    expect(body.items[0].normalBoilingPointC.pressureKPa).toBe(101.325);
    expect(body.items[0].normalBoilingPointC.source).not.toBe('');
  });
});

describe('adding and changing a compound', () => {
  it('computes formula and molar mass from the structure', async () => {
    const name = unique('ester');
    const answer = await pi
      .post('/api/v1/compounds')
      .send({ name, smiles: 'CCCCCCCCOC(C)=O', synonyms: [`${name} b`, `${name} B`] });
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({ name, formula: 'C10H20O2', synonyms: [`${name} b`], version: 0 });
    // Octyl acetate: 172.26 g/mol from the IUPAC abridged atomic weights (10 C, 20 H, 2 O).
    expect(answer.body.molarMassGMol).toBeCloseTo(172.268, 1);
    expect(answer.headers.location).toBe(`/api/v1/compounds/${answer.body.id}`);
    expect(await namesFound(`${name} b`)).toEqual([name]);
  });

  it.each([
    ['cas', { cas: '141-78-7' }, 'should be 6'],
    ['formula', { smiles: 'CCOC(C)=O', formula: 'C4H8O' }, 'C4H8O2'],
    ['formula', { formula: 'Xy4' }, 'molecular formula'],
    ['molarMassGMol', { smiles: 'CCOC(C)=O', molarMassGMol: 87.1 }, '88.1'],
    ['molarMassGMol', { formula: 'C4H8O2', molarMassGMol: 90 }, '88.1'],
    ['smiles', { smiles: 'C1CC' }, 'SMILES'],
    ['inchiKey', { inchiKey: 'ABC' }, 'InChIKey'],
  ])('refuses a contradiction in %s and says what to compare', async (path, fields, words) => {
    const { body } = await pi
      .post('/api/v1/compounds')
      .send({ name: unique('x'), ...fields })
      .expect(422);
    expect(body.errors[0].path).toBe(path);
    expect(body.errors[0].message).toContain(words);
  });

  it('takes a molar mass that differs by rounding only', async () => {
    const { body } = await pi
      .post('/api/v1/compounds')
      .send({ name: unique('x'), smiles: 'CCOC(C)=O', molarMassGMol: 88.11 })
      .expect(201);
    expect(body.molarMassGMol).toBeCloseTo(88.106, 2);
  });

  it('names the compound that has the number already', async () => {
    const { body } = await pi
      .post('/api/v1/compounds')
      .send({ name: unique('x'), cas: '108-94-1' })
      .expect(409);
    expect(body.detail).toContain('cyclohexanone');
  });

  it('is for a PI only', async () => {
    const compound = await buildCompound();
    const refused = await chemist.post('/api/v1/compounds').send({ name: 'x' }).expect(403);
    expect(refused.body.detail).toContain('PI');
    await chemist
      .patch(`/api/v1/compounds/${compound.id}`)
      .set('If-Match', '"0"')
      .send({ name: 'x' })
      .expect(403);
    const { token } = await buildToken();
    const instrument = await withToken(token);
    await instrument.post('/api/v1/compounds').send({ name: 'x' }).expect(403);
    for (const address of [
      '',
      `/${compound.id}`,
      `/${compound.id}/literature`,
      `/${compound.id}/structure.svg`,
    ])
      await instrument.get(`/api/v1/compounds${address}`).expect(403);
  });

  it('changes under the version that was read, and raises it', async () => {
    const compound = await buildCompound();
    const address = `/api/v1/compounds/${compound.id}`;
    await pi.patch(address).send({ peroxideClass: 'B' }).expect(428);
    const changed = await pi.patch(address).set('If-Match', '"0"').send({ peroxideClass: 'B' }).expect(200);
    expect(changed.body).toMatchObject({ version: 1, peroxideClass: 'B' });
    expect(changed.body.hazards.peroxide.advice).toContain('never distil to dryness');
    await pi.patch(address).set('If-Match', '"0"').send({ peroxideClass: 'A' }).expect(409);
    const synonym = unique('synonym');
    const again = await pi
      .patch(address)
      .set('If-Match', '"1"')
      .send({ synonyms: [synonym] });
    expect(again.body).toMatchObject({ version: 2, synonyms: [synonym] });
  });

  it('computes the formula anew when the structure changes, and refuses an old one beside it', async () => {
    const { body: made } = await pi
      .post('/api/v1/compounds')
      .send({ name: unique('x'), smiles: 'CCO' })
      .expect(201);
    const address = `/api/v1/compounds/${made.id}`;
    await pi.patch(address).set('If-Match', '"0"').send({ smiles: 'CCCO', formula: 'C2H6O' }).expect(422);
    const { body } = await pi.patch(address).set('If-Match', '"0"').send({ smiles: 'CCCO' }).expect(200);
    expect(body.formula).toBe('C3H8O');
  });

  it('answers 404 for an unknown id and for what is no id', async () => {
    await chemist.get(`/api/v1/compounds/${randomUUID()}`).expect(404);
    await chemist.get('/api/v1/compounds/ethanol').expect(404);
    await pi
      .patch(`/api/v1/compounds/${randomUUID()}`)
      .set('If-Match', '"0"')
      .send({ name: 'x' })
      .expect(404);
  });
});

describe('what follows from a compound', () => {
  async function compoundOf(cas: string) {
    const { body } = await chemist.get('/api/v1/compounds').query({ q: cas }).expect(200);
    return (await chemist.get(`/api/v1/compounds/${body.items[0].id}`).expect(200)).body;
  }

  it('says that ethyl acetate leaves the plate and benzyl alcohol shows under UV 254', async () => {
    const acetate = await compoundOf('141-78-6');
    expect(acetate.plate.evaporates).toBe(true);
    const alcohol = await compoundOf('100-51-6');
    expect(alcohol.plate.evaporates).toBe(false);
    const uv = alcohol.plate.visualisers.find(({ id }: { id: string }) => id === 'uv-254');
    expect(uv.state).toBe('sees');
  });

  it('draws the structure once and answers 304 to its digest', async () => {
    const { structure } = await compoundOf('108-94-1');
    const drawn = await chemist.get(structure).expect(200);
    expect(drawn.headers['content-type']).toContain('image/svg+xml');
    expect(drawn.headers['x-content-type-options']).toBe('nosniff');
    expect(Buffer.from(drawn.body).toString()).toContain('<title>Structure of cyclohexanone</title>');
    await chemist.get(structure).set('If-None-Match', drawn.headers.etag!).expect(304);
    await chemist.get(`${structure}?width=100000`).expect(400);
  });

  it('answers 404 for a compound without a structure', async () => {
    const compound = await buildCompound();
    await chemist.get(`/api/v1/compounds/${compound.id}/structure.svg`).expect(404);
  });
});
