import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { seedReference } from '@/seeders/seed-reference';
import { buildCompound, buildToken, buildUser } from '../factories/records';
import { buildIndexedCompound } from '../factories/literature';
import { type Agent, anonymous, signedIn, stopTestServer, withToken } from '../support/test-server';

let anybody: Agent;
beforeAll(async () => {
  await seedReference();
  const user = await buildUser();
  anybody = await signedIn({ email: user.email, password: user.plainPassword });
});
afterAll(stopTestServer);

const post = (what: string, body: object) => anybody.post(`/api/v1/compute/${what}`).send(body);
const mmHg = (value: number) => value * 1.33322387415;
const toluene = '108-88-3';
const ethylbenzene = '100-41-4';

describe('the boiling point at a pressure', () => {
  // Expected: Wagner or Antoine sets of the reference table, each within 0.5 °C.
  it.each([
    ['toluene', toluene, 50, 36.4],
    ['toluene', toluene, 100, 51.9],
    ['toluene', toluene, 10, 6.2],
    ['ethylbenzene', ethylbenzene, 50, 57.6],
    ['benzaldehyde', '100-52-7', 10, 59.8],
    ['benzaldehyde', '100-52-7', 50, 94.3],
    ['acetophenone', '98-86-2', 50, 114.7],
    ['cyclohexanone', '108-94-1', 50, 73.6],
    ['1-octanol', '111-87-5', 10, 88.4],
    ['nitrobenzene', '98-95-3', 10, 84],
    ['aniline', '62-53-3', 10, 68.7],
    ['water', '7732-18-5', 50, 38.1],
    ['heptane', '142-82-5', 100, 41.8],
  ])(
    'of %s (%s) at %d mmHg is %d °C, with method, uncertainty and source',
    async (name, cas, p, expected) => {
      const { body } = await post('boiling-point', { compound: cas, pressureMbar: mmHg(p) }).expect(200);
      expect(Math.abs(body.boilingPointC - expected)).toBeLessThanOrEqual(0.5);
      expect(body).toMatchObject({ liquid: name, compound: { cas } });
      expect(body.method).toMatch(/^(wagner|antoine)$/);
      expect(body.uncertaintyC).toBeGreaterThan(0);
      expect(body.source.length).toBeGreaterThan(3);
    },
  );

  it('is estimated for a liquid of which only the normal boiling point is known, and says its error', async () => {
    const body = { normalBoilingPointC: 400, associated: false, pressureMbar: mmHg(1.5) };
    const { body: answer } = await post('boiling-point', body).expect(200);
    // Common practice, read off printed nomographs: near 200 °C at about 1 mmHg.
    expect(answer.boilingPointC).toBeGreaterThan(190);
    expect(answer.boilingPointC).toBeLessThan(210);
    expect(answer).toMatchObject({ method: 'maxwell-bonnell', compound: null });
    expect(answer.uncertaintyC).toBeGreaterThan(3);
  });

  it('is raised and made less certain for a liquid that associates', async () => {
    const plain = await post('boiling-point', { normalBoilingPointC: 195, pressureMbar: 13.3 }).expect(200);
    const bound = await post('boiling-point', {
      normalBoilingPointC: 195,
      associated: true,
      pressureMbar: 13.3,
    }).expect(200);
    expect(bound.body.boilingPointC).toBeGreaterThan(plain.body.boilingPointC);
    expect(bound.body.uncertaintyC).toBeGreaterThan(plain.body.uncertaintyC);
  });

  it.each([
    ['no liquid', { pressureMbar: 10 }, 'compound'],
    ['two liquids', { compound: toluene, normalBoilingPointC: 110, pressureMbar: 10 }, 'compound'],
    ['no pressure', { compound: toluene }, 'pressureMbar'],
    ['a pressure of zero', { compound: toluene, pressureMbar: 0 }, 'pressureMbar'],
    ['a CAS number with a wrong check digit', { compound: '108-88-4', pressureMbar: 10 }, 'compound'],
  ])('is refused for %s, naming the field', async (_, body, path) => {
    const { body: problem } = await post('boiling-point', body).expect(422);
    expect(problem.errors[0].path).toBe(path);
  });

  it('is refused for a compound without a normal boiling point, saying what to add', async () => {
    const compound = await buildCompound();
    const { body } = await post('boiling-point', { compound: compound.id, pressureMbar: 10 }).expect(422);
    expect(body.detail).toMatch(/Add one with its source/);
  });
});

describe('the pressure for a temperature', () => {
  it('is the boiling point the other way', async () => {
    const { body } = await post('boiling-pressure', { compound: toluene, temperatureC: 36.4 }).expect(200);
    // 50 mmHg, Wagner set of the reference table.
    expect(Math.abs(body.pressureMbar / mmHg(50) - 1)).toBeLessThan(0.03);
    expect(body.pressureLowMbar).toBeLessThan(body.pressureMbar);
    expect(body.pressureHighMbar).toBeGreaterThan(body.pressureMbar);
  });

  it('is 3.169 kPa for water at 25 °C (IAPWS, from memory)', async () => {
    const { body } = await post('boiling-pressure', { compound: '7732-18-5', temperatureC: 25 }).expect(200);
    expect(Math.abs(body.pressureMbar / 10 - 3.169)).toBeLessThan(0.03);
  });

  it('is refused where glass stills do not reach', async () => {
    const { body } = await post('boiling-pressure', { compound: toluene, temperatureC: 300 }).expect(422);
    expect(body.errors[0].path).toBe('temperatureC');
  });
});

describe('a refractive index', () => {
  it('is carried to the temperature of the literature value', async () => {
    // 1.3690 at 27.3 °C is 1.3723 at 20 °C with the usual 4.5e-4 per °C (common practice).
    const compound = await buildIndexedCompound(1.3723, 'CRC Handbook of Chemistry and Physics');
    const given = { compound: compound.id, n: 1.369, temperatureC: 27.3 };
    const { body } = await post('refractive-index', given).expect(200);
    expect(body.correctedN).toBeCloseTo(1.3723, 4);
    expect(body).toMatchObject({ atTemperatureC: 20, literature: { n: 1.3723 } });
    expect(Math.abs(body.difference)).toBeLessThan(0.0001);
  });

  it('is carried to 25 °C where the literature value is at 25 °C', async () => {
    const compound = await buildIndexedCompound(1.37, 'a value for this test (invented)', 25);
    const { body } = await post('refractive-index', { compound: compound.id, n: 1.3723, temperatureC: 20 });
    expect(body.atTemperatureC).toBe(25);
    expect(body.correctedN).toBeCloseTo(1.3723 - 5 * 4.5e-4, 6);
  });

  it('is refused without a literature value', async () => {
    const compound = await buildCompound();
    await post('refractive-index', { compound: compound.id, n: 1.37, temperatureC: 20 }).expect(422);
  });
});

describe('a separation', () => {
  it('says boiling points, relative volatility, stages, advice and cautions', async () => {
    const { body } = await post('separation', { light: toluene, heavy: ethylbenzene, pressureMbar: 1013.25 });
    // Normal boiling points 110.6 and 136.2 °C (CRC Handbook).
    expect(body.lightBoilingPointC).toBeCloseTo(110.6, 0);
    expect(body.heavyBoilingPointC).toBeCloseTo(136.2, 0);
    // Fenske: N ln(alpha) = 2 ln(0.95/0.05), for any alpha.
    expect(body.minimumStages * Math.log(body.relativeVolatility)).toBeCloseTo(2 * Math.log(19), 6);
    expect(body.advice).toMatch(/column/);
    expect(body.cautions.map((one: { code: string }) => one.code)).toContain('closed-system');
    expect(body.azeotropes).toEqual([]);
  });

  it('warns of a known azeotrope by name and composition, with its source', async () => {
    const { body } = await post('separation', {
      light: '64-17-5',
      heavy: '7732-18-5',
      pressureMbar: 1013.25,
    }).expect(200);
    // Ethanol and water: 95.6 % by mass ethanol, 78.2 °C.
    expect(body.azeotropes[0].lightMassPercent).toBeCloseTo(95.6, 0);
    expect(body.azeotropes[0].boilingPointC).toBeCloseTo(78.2, 0);
    const [first] = body.cautions;
    expect(first).toMatchObject({ code: 'azeotrope', severity: 'warning' });
    expect(first.text).toMatch(/ethanol and water/);
    expect(first.basis.length).toBeGreaterThan(3);
  });

  it('warns of implosion under reduced pressure', async () => {
    const { body } = await post('separation', { light: toluene, heavy: ethylbenzene, pressureMbar: 66.7 });
    expect(body.cautions.map((one: { code: string }) => one.code)).toContain('implosion');
  });

  it('is refused with light and heavy swapped, twice the same, or a purity in per cent', async () => {
    const swapped = { light: ethylbenzene, heavy: toluene, pressureMbar: 1013.25 };
    const { body } = await post('separation', swapped).expect(422);
    expect(body.detail).toMatch(/swap/);
    await post('separation', { light: toluene, heavy: toluene, pressureMbar: 1013.25 }).expect(422);
    await post('separation', { ...swapped, light: toluene, heavy: ethylbenzene, lightPurity: 95 }).expect(
      422,
    );
  });
});

describe('who may ask the planner', () => {
  it('is anybody who is signed in, and a token; nobody else', async () => {
    const body = { normalBoilingPointC: 110.6, pressureMbar: 66.7 };
    await (await anonymous()).post('/api/v1/compute/boiling-point').send(body).expect(401);
    const { token } = await buildToken();
    await (await withToken(token)).post('/api/v1/compute/boiling-point').send(body).expect(200);
  });
});
