import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Group } from '@/lib/database/records';
import { deliverDueMessages } from '@/lib/mail/deliver-due-messages';
import { buildEmgTrace } from '../factories/emg-trace';
import { drawPlatePhoto } from '../factories/plate-photo';
import { buildGroup, buildToken, buildUser, type BuiltUser } from '../factories/records';
import {
  closeBrowser,
  desk,
  keepPicture,
  openContext,
  phone,
  seriousFindings,
  signInOnPage,
} from '../support/browser';
import { signedIn, stopTestServer, testServer, withToken } from '../support/test-server';

/*
 * The whole job once, each person doing the main thing of theirs: benzaldehyde with benzyl alcohol,
 * under 66.7 mbar (50 mmHg), where benzaldehyde boils at 94.3 °C (Wagner, VDI Heat Atlas).
 */
let group: Group;
let chemist: BuiltUser, analyst: BuiltUser, pi: BuiltUser;
let token: string;
let runCode = '';
const fractionCode = () => `${runCode}-F1`;

const credentials = (user: BuiltUser) => ({ email: user.email, password: user.plainPassword });

async function compoundId(user: BuiltUser, cas: string): Promise<string> {
  const agent = await signedIn(credentials(user));
  const { body } = await agent.get(`/api/v1/compounds?q=${cas}`).expect(200);
  return body.items[0].id as string;
}

beforeAll(async () => {
  await testServer();
  group = await buildGroup();
  chemist = await buildUser({ group, roles: ['chemist'], name: 'Ottilie Brandt' });
  analyst = await buildUser({ group, roles: ['analyst'], name: 'Joris Adeyemi' });
  pi = await buildUser({ group, roles: ['pi'], name: 'Maren Castellan' });
  ({ token } = await buildToken({ group, scopes: ['evidence:write'] }));
  const agent = await signedIn(credentials(pi));
  await agent
    .post(`/api/v1/compounds/${await compoundId(pi, '100-52-7')}/specifications`)
    .send({
      grade: 'recovered',
      decisionRule: 'simple',
      approve: true,
      criteria: {
        gcAreaPercentMin: 99,
        refractiveIndexTolerance: 0.001,
        boilingRange: { toleranceC: 3 },
        tlcCleanUnder: ['uv-254'],
      },
    })
    .expect(201);
}, 120_000);

afterAll(async () => {
  await closeBrowser();
  await stopTestServer();
});

async function choose(page: Page, label: string, typed: string, option: RegExp) {
  await page.getByRole('combobox', { name: label }).fill(typed);
  await page.getByRole('option', { name: option }).first().click();
}

/** Presses on the plate photo at a place given in the photo's own pixels. */
async function pressOnPlate(page: Page, x: number, y: number, width: number, height: number) {
  const plate = page.getByRole('group', { name: /^Plate photo/ });
  const box = (await plate.boundingBox())!;
  await plate.click({ position: { x: (x / width) * box.width, y: (y / height) * box.height } });
}

describe('one fraction from the still to the signature', () => {
  it('the chemist starts a run and a fraction on a phone', async () => {
    const { context, offSite } = await openContext(phone);
    const page = await context.newPage();
    await signInOnPage(page, credentials(chemist));
    await page.goto('/runs/new');
    await choose(page, 'Target compound', '100-52-7', /^benzaldehyde/);
    await choose(page, 'Known impurities', '100-51-6', /^benzyl alcohol/);
    await page.getByLabel('Charge', { exact: true }).fill('240');
    await page.getByLabel('Source of the charge').fill('oxidation 7 (invented)');
    await page.getByLabel('Technique').selectOption('reduced pressure');
    await page.getByLabel('Planned pressure').first().fill('66.7');
    await page.getByRole('button', { name: 'Start the run' }).click();
    await page.waitForURL(/\/runs\/D-\d{4}-\d{4}$/);
    runCode = page.url().split('/').at(-1)!;

    await page.goto(`/runs/${runCode}/fractions/new`);
    await page.getByText('heart', { exact: true }).click();
    await page.getByLabel('Tare').fill('101.20');
    await page.getByLabel('Gross').fill('184.75');
    await page.getByLabel('From').fill('94.0');
    await page.getByLabel('To', { exact: true }).fill('94.8');
    await page.getByLabel('Pressure').first().fill('66.7');
    await page.getByRole('button', { name: 'Start the fraction' }).click();
    await page.waitForURL(`**/runs/${runCode}`);
    await page
      .getByRole('link', { name: new RegExp(fractionCode()) })
      .first()
      .waitFor();
    expect(await seriousFindings(page)).toEqual([]);
    await keepPicture(page, 'run-phone');
    expect(offSite).toEqual([]);
    await context.close();
  });

  it('marks a plate photo so that Rf is the true one', async () => {
    const photo = await drawPlatePhoto({
      lanes: [{ spots: [{ rf: 0.52 }] }, { spots: [{ rf: 0.52 }, { rf: 0.21 }] }],
    });
    const file = join(mkdtempSync(join(tmpdir(), 'heartcut-')), 'plate.jpg');
    writeFileSync(file, photo.jpeg);
    const { context } = await openContext(desk);
    const page = await context.newPage();
    await signInOnPage(page, credentials(chemist));
    await page.goto(`/runs/${runCode}/plates/new`);
    await page.locator('input[type=file]').first().setInputFiles(file);
    // A photo that was just sent is opened for marking at once.
    await page.waitForURL(/photo=/);
    const press = (x: number, y: number) => pressOnPlate(page, x, y, photo.widthPx, photo.heightPx);
    const mode = (name: string) => page.getByRole('button', { name, exact: true }).click();
    await mode('Baseline');
    await press(60, photo.baselineY);
    await press(photo.widthPx - 60, photo.baselineY);
    await mode('Front');
    await press(60, photo.frontY);
    await press(photo.widthPx - 60, photo.frontY);
    await mode('Lane');
    for (const lane of photo.lanes) await press(lane.x, (photo.baselineY + photo.frontY) / 2 + 40);
    await mode('Spot');
    for (const spot of photo.lanes.flatMap((lane) => lane.spots)) await press(spot.x, spot.y);
    const holds = page.getByLabel('Holds');
    await holds.nth(0).selectOption('fraction');
    await page.getByLabel('Fraction', { exact: true }).selectOption(fractionCode());
    await holds.nth(1).selectOption('crude');
    await page.getByLabel('Stationary phase').fill('silica gel 60 F254');
    await page.getByLabel('Eluent').fill('hexane / ethyl acetate 4:1');
    await page.getByLabel('Made visible by').selectOption('uv-254');
    await keepPicture(page, 'plate-desk');
    await page.getByRole('button', { name: 'Save the plate' }).click();
    await page.waitForURL(/\/plates\/[0-9a-f-]{36}/);
    const agent = await signedIn(credentials(chemist));
    const { body } = await agent.get(`/api/v1/plates/${/[0-9a-f-]{36}/.exec(page.url())![0]}`).expect(200);
    const rfs = body.lanes.map((lane: { spots: { rf: number }[] }) => lane.spots.map((spot) => spot.rf));
    const truth = photo.lanes.map((lane) => lane.spots.map((spot) => spot.rf));
    rfs
      .flat()
      .forEach((rf: number, index: number) => expect(Math.abs(rf - truth.flat()[index]!)).toBeLessThan(0.01));
    expect(rfs.flat()).toHaveLength(3);
    await context.close();
  });

  it('reads the refractometer and submits, on the phone', async () => {
    const { context } = await openContext(phone);
    const page = await context.newPage();
    await signInOnPage(page, credentials(chemist));
    await page.goto(`/fractions/${fractionCode()}/refractive-index`);
    const { body } = await (
      await signedIn(credentials(chemist))
    )
      .get(`/api/v1/compounds/${await compoundId(chemist, '100-52-7')}/literature?limit=200`)
      .expect(200);
    const value = body.items.find(
      (item: { property: string; preferred: boolean }) =>
        item.property === 'refractive index' && item.preferred,
    );
    const literature = { n: value.value as number, temperatureC: value.conditions.temperatureC as number };
    await page.getByLabel('n 1').fill((literature.n + 0.0001).toFixed(4));
    await page.getByLabel('n 2').fill((literature.n + 0.0002).toFixed(4));
    await page.getByLabel('Temperature of the prism').fill(String(literature.temperatureC));
    await page.getByLabel('Pure water reads').fill('1.3330');
    await page.getByLabel('Temperature of the water').fill('20');
    const answered = page.waitForResponse(
      (response) => response.url().endsWith('/refractive-readings') && response.request().method() === 'POST',
    );
    await page.getByRole('button', { name: 'Save and compare' }).click();
    expect((await answered).status(), await (await answered).text()).toBe(201);
    await keepPicture(page, 'refractive-index-phone');
    await page.goto(`/fractions/${fractionCode()}`);
    await keepPicture(page, 'fraction-phone');
    expect(await seriousFindings(page)).toEqual([]);
    await page
      .getByRole('button', { name: /^Submit/ })
      .first()
      .click();
    await page
      .getByRole('dialog')
      .getByRole('button', { name: /^Submit/ })
      .click();
    await page.getByText('submitted', { exact: true }).first().waitFor();
    await context.close();
  });

  it('the instrument PC uploads the trace by token, and it is integrated', async () => {
    const trace = buildEmgTrace({
      durationMin: 10,
      pointCount: 6000,
      noise: 0.02,
      peaks: [
        { areaUnits: 99.6, atMin: 5.1, sigmaMin: 0.03, tauMin: 0.01 },
        { areaUnits: 0.4, atMin: 6.2, sigmaMin: 0.03, tauMin: 0.01 },
      ],
    });
    const rows = Array.from(trace.timeMin, (t, i) => `${t.toFixed(5)},${trace.signal[i]!.toFixed(6)}`);
    const csv = ['time (min),FID (pA)', ...rows].join('\n') + '\n';
    const pc = await withToken(token);
    const { body } = await pc
      .post(`/api/v1/evidence?fraction=${fractionCode()}&kind=gc-trace`)
      .set('Content-Type', 'text/csv')
      .set('X-Filename', 'run-7.csv')
      .send(csv)
      .expect(201);
    expect(body.evidence.kind).toBe('gc-trace');
  });

  it('the analyst assigns the main peak, reads the verdict and signs off', async () => {
    const { context } = await openContext(desk);
    const page = await context.newPage();
    await signInOnPage(page, credentials(analyst));
    await page.goto('/queue');
    await page
      .getByRole('link', { name: new RegExp(fractionCode()) })
      .first()
      .click();
    await page.waitForURL(`**/fractions/${fractionCode()}`);
    await page.locator('a[href^="/traces/"]').first().click();
    await page.waitForURL(/\/traces\//);
    await page.getByRole('button', { name: 'Assign peak 1' }).click();
    const dialog = page.getByRole('dialog');
    await dialog.getByRole('combobox', { name: 'Compound' }).fill('100-52-7');
    await dialog
      .getByRole('option', { name: /^benzaldehyde/ })
      .first()
      .click();
    await dialog.getByLabel('Reason').fill('retention time of the reference');
    await dialog.getByRole('button').last().click();
    await dialog.waitFor({ state: 'detached' });
    await keepPicture(page, 'trace-desk');
    await page.goto(`/fractions/${fractionCode()}`);
    await keepPicture(page, 'fraction-desk');
    expect(await seriousFindings(page)).toEqual([]);
    await page
      .getByRole('button', { name: /^Sign off/ })
      .first()
      .click();
    await page.getByLabel('Meaning of the signature').selectOption('reviewed and released for use');
    await page.getByLabel('Your password, once more').fill(analyst.plainPassword);
    await page.getByRole('dialog').getByRole('button', { name: /^Sign/ }).click();
    await page.getByText('signed off', { exact: true }).first().waitFor();
    await context.close();
  });

  it('the PI finds the fraction by compound, and mail is in the inbox', async () => {
    const { context } = await openContext(desk);
    const page = await context.newPage();
    await signInOnPage(page, credentials(pi));
    await page.goto('/fractions?compound=benzaldehyde&status=signed+off');
    await page
      .getByRole('link', { name: new RegExp(fractionCode()) })
      .first()
      .waitFor();
    await keepPicture(page, 'browse-desk');
    expect(await seriousFindings(page)).toEqual([]);
    await context.close();
    // The demo laboratory has mail of its own waiting; a round sends twenty.
    while ((await deliverDueMessages()) > 0);
    const inbox = (await (await fetch(`${process.env.HEARTCUT_INBOX_URL}/messages.json`)).json()) as unknown;
    const text = JSON.stringify(inbox);
    expect(text).toContain(fractionCode());
    for (const { email } of [chemist, analyst, pi]) expect(text).toContain(email);
  });
});
