import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/database/connection';
import { checkSignature } from '@/lib/signoff/check-signature';
import { newSignatureCode, readSignatureCode } from '@/lib/signoff/signature-code';
import { type Bench, buildBench, buildSubmittedFraction, release } from '../factories/signing-bench';
import { anonymous, stopTestServer } from '../support/test-server';

let bench: Bench;
beforeAll(async () => {
  bench = await buildBench();
});
afterAll(stopTestServer);

async function signedFraction() {
  const fraction = await buildSubmittedFraction(bench);
  const { body } = await bench.analyst.agent
    .post(`/api/v1/fractions/${fraction.code}/sign-off`)
    .send(release(bench.analyst))
    .expect(200);
  return { fraction, code: body.signature.code as string };
}

const change = (sql: string, replacements: unknown[]) =>
  database().query(sql, { replacements, type: QueryTypes.UPDATE });

describe('the public check of a signature', () => {
  it('says genuine and in force, and nothing about fraction, compound or people', async () => {
    const { fraction, code } = await signedFraction();
    const page = await (await anonymous()).get(`/verify/${code}`).expect(200);
    expect(page.text).toContain('genuine');
    expect(page.text).toContain('in force');
    for (const secret of [fraction.code, bench.compound.name, bench.analyst.name, bench.group.name])
      expect(page.text).not.toContain(secret);
  });

  it('takes the code as people type it', async () => {
    const { code } = await signedFraction();
    expect(await checkSignature(code.toLowerCase().replaceAll('-', ' '))).toMatchObject({
      known: true,
      genuine: true,
    });
    expect(readSignatureCode('oIl0-1111-2222')).toBe('0110-1111-2222');
    expect(readSignatureCode("' OR 1=1 --")).toBeNull();
  });

  it('says superseded once the fraction was reopened', async () => {
    const { fraction, code } = await signedFraction();
    await bench.pi.agent
      .post(`/api/v1/fractions/${fraction.code}/reopen`)
      .send({ reason: 'wrong receiver' })
      .expect(200);
    const check = await checkSignature(code);
    expect(check).toMatchObject({ genuine: true, inForce: false });
    const page = await (await anonymous()).get(`/verify/${code}`).expect(200);
    expect(page.text).toContain('no longer in force');
    expect(page.text).not.toContain('wrong receiver');
  });

  it('is not in force when a record was changed behind the back of the application', async () => {
    const { fraction, code } = await signedFraction();
    await change('UPDATE fractions SET grossMassG = grossMassG + 1 WHERE id = ?', [fraction.id]);
    expect(await checkSignature(code)).toMatchObject({ genuine: true, inForce: false });
  });

  it('is not genuine when its manifest, its meaning or its signer was changed', async () => {
    const one = await signedFraction();
    await change(
      'UPDATE signatures SET manifest = REPLACE(manifest, \'"pass"\', \'"fail"\') WHERE code = ?',
      [one.code],
    );
    expect(await checkSignature(one.code)).toMatchObject({ genuine: false, inForce: false });
    const two = await signedFraction();
    await change("UPDATE signatures SET signerName = 'Somebody else' WHERE code = ?", [two.code]);
    expect(await checkSignature(two.code)).toMatchObject({ genuine: false, inForce: false });
  });

  it('says not known for any other code, with the same status', async () => {
    const visitor = await anonymous();
    for (const code of [newSignatureCode(), 'nonsense']) {
      const page = await visitor.get(`/verify/${code}`).expect(200);
      expect(page.text).toContain('not known');
    }
  });
});
