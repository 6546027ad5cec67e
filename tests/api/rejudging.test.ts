import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Compound, Fraction, Verdict } from '@/lib/database/records';
import { buildKnownImpurity } from '../factories/acceptance';
import { buildCompound, buildFraction, buildRun } from '../factories/records';
import { type Bench, buildBench } from '../factories/signing-bench';
import { stopTestServer, unique } from '../support/test-server';

let bench: Bench;
beforeAll(async () => {
  bench = await buildBench();
});
afterAll(stopTestServer);

/** An open, judged fraction with a lane on a plate under UV 254, of a run with one impurity that nothing is known of. */
async function fractionWithImpurity() {
  const impurity = await buildCompound();
  const run = await buildRun({ group: bench.group, chemist: bench.chemist });
  await buildKnownImpurity(run, impurity);
  const fraction = await buildFraction({ run });
  const photo = await sharp({ create: { width: 400, height: 800, channels: 3, background: '#7fbf7f' } })
    .jpeg()
    .withExifMerge({ IFD0: { ImageDescription: unique('photo') } })
    .toBuffer();
  const { body } = await bench.chemist.agent
    .post(`/api/v1/evidence?run=${run.code}&kind=plate-photo`)
    .set('Content-Type', 'image/jpeg')
    .set('X-Filename', 'plate.jpg')
    .send(photo)
    .expect(201);
  await bench.chemist.agent
    .post(`/api/v1/runs/${run.code}/plates`)
    .send({
      evidenceId: body.evidence.id,
      stationaryPhase: 'silica gel 60 F254',
      eluent: 'hexane / ethyl acetate 4:1',
      visualiser: 'uv-254',
      units: 'px',
      baseline: [{ x: 0, y: 700 }],
      front: [{ x: 0, y: 100 }],
      lanes: [
        { label: '1', subject: { kind: 'fraction', code: fraction.code }, spots: [{ x: 200, y: 400 }] },
      ],
    })
    .expect(201);
  return { impurity, fraction };
}

async function addBoilingPoint(compound: Compound): Promise<void> {
  const value = { property: 'normal boiling point', value: 205, pressureKPa: 101.325 };
  await bench.pi.agent
    .post(`/api/v1/compounds/${compound.id}/literature`)
    .send({ ...value, source: 'invented for this test' })
    .expect(201);
}

/** What the stored verdict says of what the tests can see. */
async function coverageOf(fraction: { id: string }): Promise<string> {
  const { verdictId } = await Fraction.findByPk(fraction.id, { rejectOnEmpty: true });
  return JSON.stringify((await Verdict.findByPk(verdictId ?? '', { rejectOnEmpty: true })).coverage);
}

describe('a compound that is a known impurity', () => {
  it('has its open fractions judged anew when its literature changes', async () => {
    const { impurity, fraction } = await fractionWithImpurity();
    const before = await coverageOf(fraction);
    await addBoilingPoint(impurity);
    expect(await coverageOf(fraction)).not.toBe(before);
  });

  it('has its open fractions judged anew when its structure changes, and not for another name', async () => {
    const { impurity, fraction } = await fractionWithImpurity();
    // Without it the lamp's answer would be that the compound may have left the plate.
    await addBoilingPoint(impurity);
    const before = await Fraction.findByPk(fraction.id, { rejectOnEmpty: true });
    const text = await coverageOf(fraction);
    const change = async (json: object) => {
      const { version } = await Compound.findByPk(impurity.id, { rejectOnEmpty: true });
      await bench.pi.agent
        .patch(`/api/v1/compounds/${impurity.id}`)
        .set('If-Match', `"${version}"`)
        .send(json)
        .expect(200);
    };
    await change({ synonyms: [`another name of ${impurity.id}`] });
    expect((await Fraction.findByPk(fraction.id))?.verdictId).toBe(before.verdictId);
    // An aromatic ring shows under a lamp of 254 nm.
    await change({ smiles: 'OCc1ccccc1' });
    expect(await coverageOf(fraction)).not.toBe(text);
  });
});
