import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { photographPlate, sendPlatePhoto, tiltedScene, trueMarks, views } from '../factories/marked-plate';
import { buildEthylAcetate, buildFraction, buildGroup, buildRun, buildUser } from '../factories/records';
import {
  closeBrowser,
  desk,
  keepPicture,
  openContext,
  phone,
  scrollsSideways,
  seriousFindings,
  signInOnPage,
} from '../support/browser';
import { signedIn, stopTestServer } from '../support/test-server';

let person: Awaited<ReturnType<typeof buildUser>>;
let fractionCode: string;
let plateId: string;
const credentials = () => ({ email: person.email, password: person.plainPassword });

beforeAll(async () => {
  const group = await buildGroup();
  const target = await buildEthylAcetate();
  const run = await buildRun({ group, target });
  fractionCode = (await buildFraction({ run })).code;
  person = await buildUser({ group, roles: ['analyst'] });
  const analyst = await signedIn(credentials());
  const photo = await photographPlate(tiltedScene, views.tilted);
  const marks = trueMarks(photo);
  const subjects = [
    { kind: 'crude' },
    { kind: 'fraction', code: fractionCode },
    { kind: 'reference' },
    { kind: 'reference' },
    { kind: 'blank' },
  ];
  const { body } = await analyst
    .post(`/api/v1/runs/${run.code}/plates`)
    .send({
      evidenceId: await sendPlatePhoto(analyst, run.code, photo.jpeg),
      stationaryPhase: 'silica gel 60 F254',
      eluent: 'hexane / ethyl acetate 4:1',
      visualiser: 'uv-254',
      widthMm: 50,
      heightMm: 100,
      ...marks,
      lanes: marks.lanes.map((lane, l) => ({ ...lane, label: `${l + 1}`, subject: subjects[l] })),
    })
    .expect(201);
  plateId = body.id;
});
afterAll(async () => {
  await closeBrowser();
  await stopTestServer();
});

describe('the report of a plate', () => {
  it('shows picture, Rf with uncertainty and what the lanes say, on a desk and on a phone', async () => {
    for (const [name, options] of Object.entries({ desk, phone })) {
      const { context, offSite } = await openContext(options);
      const page = await context.newPage();
      await signInOnPage(page, credentials());
      await page.goto(`/plates/${plateId}/report`);
      await page.getByRole('heading', { name: 'Plate report' }).waitFor();
      const text = (await page.locator('main').textContent()) ?? '';
      for (const piece of [
        '0.32',
        'u(Rf)',
        'hexane / ethyl acetate 4:1',
        'UV 254 nm',
        `fraction ${fractionCode}`,
        'Disappeared from the crude',
        'could not have been seen',
        'Freed of perspective',
      ])
        expect(text).toContain(piece);
      // The picture itself has come, at the size that was asked for.
      const widthPx = await page.evaluate(async () => {
        const href = document.querySelector('svg image')!.getAttribute('href')!;
        const picture = new Image();
        picture.src = href;
        await picture.decode();
        return picture.naturalWidth;
      });
      expect(widthPx).toBe(800);
      expect(await seriousFindings(page)).toEqual([]);
      expect(await scrollsSideways(page)).toBe(false);
      await keepPicture(page, `plate-report-${name}`);
      if (name === 'desk') {
        await page.emulateMedia({ media: 'print' });
        expect(await page.getByRole('button', { name: 'Print' }).isVisible()).toBe(false);
        await keepPicture(page, 'plate-report-print');
      }
      expect(offSite).toEqual([]);
      await context.close();
    }
  });
});
