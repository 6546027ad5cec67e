import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { PlateView } from '@/lib/evidence/tlc/schema';
import { photographPlate, sendPlatePhoto, tiltedScene, trueMarks, views } from '../factories/marked-plate';
import type { RenderedPlate } from '../factories/plate-renderer/render-plate';
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
import {
  clickPhoto,
  fillFacts,
  modeButton,
  moveFingers,
  onScreen,
  openMarking,
  tapPhoto,
  wayOf,
} from '../support/marking-page';
import { type Agent, signedIn, stopTestServer, testServer } from '../support/test-server';

let person: Awaited<ReturnType<typeof buildUser>>;
let agent: Agent;
let runCode = '';
let uv: RenderedPlate, stained: RenderedPlate;
const credentials = () => ({ email: person.email, password: person.plainPassword });

beforeAll(async () => {
  await testServer();
  const group = await buildGroup();
  const run = await buildRun({ group, target: await buildEthylAcetate() });
  await buildFraction({ run });
  runCode = run.code;
  person = await buildUser({ group, roles: ['chemist'] });
  agent = await signedIn(credentials());
  uv = await photographPlate(tiltedScene, views.tilted);
  stained = await photographPlate({ ...tiltedScene, look: 'anisaldehyde' }, views.otherwise);
});
afterAll(async () => {
  await closeBrowser();
  await stopTestServer();
});

/** A photo that nobody has marked, open for marking by a signed-in person. */
async function openFresh(options: Parameters<typeof openContext>[0], photo: RenderedPlate) {
  const evidenceId = await sendPlatePhoto(agent, runCode, photo.jpeg);
  const { context, offSite } = await openContext(options);
  const page = await context.newPage();
  await signInOnPage(page, credentials());
  const path = `/runs/${runCode}/plates/new?photo=${evidenceId}`;
  await openMarking(page, path);
  return { context, page, evidenceId, path, offSite };
}

async function savedPlate(page: Page): Promise<PlateView> {
  await page.waitForURL(/\/plates\/[0-9a-f-]{36}/);
  const id = /\/plates\/([0-9a-f-]{36})/.exec(page.url())![1];
  return (await agent.get(`/api/v1/plates/${id}`).expect(200)).body as PlateView;
}
async function platesOf(evidenceId: string): Promise<PlateView[]> {
  const { body } = await agent.get(`/api/v1/runs/${runCode}/plates?limit=200`).expect(200);
  return (body.items as PlateView[]).filter((plate) => plate.evidenceId === evidenceId);
}

/** Every true spot has a marked one within 0.01 of its Rf; answers how many are marked. */
function expectTrueRf(plate: PlateView, photo: RenderedPlate): number {
  const found = plate.lanes.flatMap((lane) => lane.spots.map((spot) => spot.rf)).sort();
  const truth = photo.truth.lanes.flatMap((lane) => lane.spots.map((spot) => spot.rf)).sort();
  truth.forEach((rf) => expect(Math.min(...found.map((one) => Math.abs(one - rf)))).toBeLessThan(0.01));
  return found.length;
}
const mark = (page: Page, name: string | RegExp) =>
  page.getByRole('group', { name: /^Plate photo/ }).getByRole('button', { name });
const cornersOf = ({ truth }: RenderedPlate) => truth.corners;
const spotsOf = ({ truth }: RenderedPlate) => truth.lanes.flatMap((lane) => lane.spots);
const save = (page: Page) => page.getByRole('button', { name: 'Save the plate' });

describe('a proposal', () => {
  it('is shown as one, accepted, moved and taken away mark by mark, and stays in the record', async () => {
    const { context, page, offSite } = await openFresh(desk, uv);
    await page.getByRole('button', { name: 'Propose marks' }).click();
    await page.getByText(/^Decide the \d+ proposed marks one by one$/).waitFor();
    await keepPicture(page, 'plate-proposed-desk');
    expect(await seriousFindings(page)).toEqual([]);
    await page.getByText(/^Decide the/).click();
    await page.getByRole('button', { name: 'Accept: Top left corner' }).click();
    await mark(page, /^Top left corner$/).waitFor();
    await fillFacts(page);
    // Nothing is saved unseen: the page asks.
    await save(page).click();
    const question = page.getByRole('dialog', { name: /Save without the \d+ marks/ });
    await question.getByText(/Mark all four corners/).waitFor();
    await question.getByRole('button', { name: 'Look at them again' }).click();
    expect(await mark(page, /proposed \(/).count()).toBeGreaterThan(0);
    const [first] = spotsOf(uv);
    await clickPhoto(page, first!);
    await page.getByRole('button', { name: 'Take it away' }).click();
    expect(await mark(page, /, spot/).count()).toBe(spotsOf(uv).length - 1);
    await page.getByRole('button', { name: 'Undo', exact: true }).click();
    await page.getByRole('button', { name: 'Accept all' }).click();
    await page.getByText('No proposed mark is left to decide.').waitFor();
    await keepPicture(page, 'plate-accepted-desk');
    await save(page).click();
    const plate = await savedPlate(page);
    expect(expectTrueRf(plate, uv)).toBe(spotsOf(uv).length);
    expect(plate.photos[0]!.proposal).toMatchObject({ moved: 0, added: 0, removed: 0 });
    await page.getByRole('heading', { name: 'Lane profiles' }).waitFor();
    await page
      .getByText(/^Areas in this lane/)
      .first()
      .waitFor();
    await keepPicture(page, 'plate-saved-desk');
    expect(offSite).toEqual([]);
    await context.close();
  });

  it('that cannot be had is said in words, and the plate can be marked all the same', async () => {
    const { context, page } = await openFresh(desk, uv);
    await page.route('**/plate-suggestion', (route) =>
      route.fulfill({
        status: 503,
        contentType: 'application/problem+json',
        body: JSON.stringify({ detail: 'The server has too much to do. Try again in a minute.' }),
      }),
    );
    await page.getByRole('button', { name: 'Propose marks' }).click();
    await page.getByText(/too much to do.*by hand all the same/).waitFor();
    await modeButton(page, 'Lane').click();
    await clickPhoto(page, spotsOf(uv)[0]!);
    await mark(page, /^Lane 1$/).waitFor();
    await context.close();
  });
});

describe('marking by hand', () => {
  it('by mouse: corners, lines, lanes and spots; press to choose, press to place; drag; undo and redo', async () => {
    const { context, page } = await openFresh(desk, uv);
    const marks = trueMarks(uv);
    await modeButton(page, 'Corners').click();
    for (const index of [2, 0, 3, 1]) await clickPhoto(page, cornersOf(uv)[index]!);
    await modeButton(page, 'Baseline').click();
    for (const point of marks.baseline) await clickPhoto(page, point);
    await modeButton(page, 'Front').click();
    for (const point of marks.front) await clickPhoto(page, point);
    await modeButton(page, 'Lane').click();
    for (const lane of uv.truth.lanes) await clickPhoto(page, { x: lane.x, y: lane.y - 25 });
    await modeButton(page, 'Spot').click();
    const [first, ...others] = spotsOf(uv);
    // The first is set beside its place, and put right by choosing and placing it.
    const beside = { x: first!.x + 40, y: first!.y + 70 };
    await clickPhoto(page, beside);
    for (const spot of others) await clickPhoto(page, spot);
    await modeButton(page, 'Move').click();
    await clickPhoto(page, beside);
    await clickPhoto(page, first!);
    await fillFacts(page);
    const table = page.getByRole('table', { name: /^Rf with standard uncertainty/ });
    await table
      .getByText(/0\.3[123] ± 0\.0\d/)
      .first()
      .waitFor();

    // Dragged away under the loupe, and back by undo; redone and undone once more by the keys.
    const from = await onScreen(page, others[0]!);
    await page.mouse.move(from.x, from.y);
    await page.mouse.down();
    for (const step of wayOf(from, { x: from.x + 3, y: from.y + 60 })) await page.mouse.move(step.x, step.y);
    expect(await page.locator('[data-part="loupe"]').count()).toBe(1);
    await keepPicture(page, 'plate-loupe-desk');
    await page.mouse.up();
    expect(await page.locator('[data-part="loupe"]').count()).toBe(0);
    const rowsNow = () => table.getByRole('row').allInnerTexts();
    const dragged = await rowsNow();
    await page.keyboard.press('Control+z');
    expect(await rowsNow()).not.toEqual(dragged);
    await page.keyboard.press('Control+Shift+z');
    expect(await rowsNow()).toEqual(dragged);
    await page.keyboard.press('Control+z');
    await save(page).click();
    const plate = await savedPlate(page);
    expect(expectTrueRf(plate, uv)).toBe(spotsOf(uv).length);
    expect(plate.corners).toHaveLength(4);
    expect(plate.flags).not.toContain('perspective not corrected');
    expect(plate.photos[0]!.proposal).toBeNull();
    await context.close();
  });

  it('by touch on a phone: tap, drag under the loupe, zoom by two fingers, tap to place', async () => {
    const { context, page } = await openFresh(phone, stained);
    const marks = trueMarks(stained);
    await modeButton(page, 'Corners').tap();
    for (const corner of cornersOf(stained)) await tapPhoto(page, corner);
    await mark(page, 'Bottom left corner').waitFor();
    await modeButton(page, 'Baseline').tap();
    for (const point of marks.baseline) await tapPhoto(page, point);
    await modeButton(page, 'Front').tap();
    await tapPhoto(page, marks.front[0]!);
    await tapPhoto(page, marks.front.at(-1)!);
    await modeButton(page, 'Lane').tap();
    const [lane] = stained.truth.lanes;
    await tapPhoto(page, { x: lane!.x, y: lane!.y - 120 });
    await modeButton(page, 'Spot').tap();
    const [low, high] = lane!.spots;
    await tapPhoto(page, { x: low!.x, y: low!.y + 60 });
    const spot = mark(page, /^Lane 1, spot 1/);
    await spot.waitFor();
    expect(await page.getByText('100 %', { exact: true }).count()).toBe(1);

    // 44 px to hit, whatever the zoom.
    const reach = (await spot.locator('circle').first().boundingBox())!;
    expect(Math.min(reach.width, reach.height)).toBeGreaterThanOrEqual(44 - 0.1);

    const start = await onScreen(page, { x: low!.x, y: low!.y + 60 });
    const end = await onScreen(page, low!, false);
    const up = { x: end.x, y: end.y };
    await moveFingers(
      page,
      wayOf({ x: start.x, y: start.y }, up).map((one) => [one]),
      async () => {
        const loupe = (await page.locator('[data-part="loupe"] > circle').first().boundingBox())!;
        const isOver =
          up.x > loupe.x && up.x < loupe.x + loupe.width && up.y > loupe.y && up.y < loupe.y + loupe.height;
        expect(isOver).toBe(false);
        await page.screenshot({
          path: `${process.env.HEARTCUT_HOME ?? '.local-test'}/pictures/plate-loupe-phone.png`,
        });
      },
    );
    await page.getByRole('button', { name: 'Undo', exact: true }).tap();
    await page.getByRole('button', { name: 'Redo', exact: true }).tap();

    // Two fingers enlarge the photo; their lifting sets no mark.
    const centre = await onScreen(page, { x: 450, y: 600 });
    await moveFingers(
      page,
      Array.from({ length: 9 }, (_, i) => [
        { x: centre.x - 30 - 6 * i, y: centre.y },
        { x: centre.x + 30 + 6 * i, y: centre.y },
      ]),
    );
    const zoomed = page.getByRole('status').filter({ hasText: /^\d+ %$/ });
    expect(Number.parseInt(await zoomed.innerText(), 10)).toBeGreaterThan(200);
    expect(await mark(page, /, spot/).count()).toBe(1);
    await page.getByRole('button', { name: 'Zoom out' }).tap();
    for (let step = 0; step < 4; step += 1) await page.getByRole('button', { name: 'Zoom out' }).tap();
    expect(await zoomed.innerText()).toBe('100 %');

    // Set beside its place, then chosen by a tap and placed by another: no dragging is needed.
    await tapPhoto(page, { x: high!.x + 90, y: high!.y + 90 });
    await mark(page, /^Lane 1, spot 2/).waitFor();
    await modeButton(page, 'Move').tap();
    await tapPhoto(page, { x: high!.x + 90, y: high!.y + 90 });
    await tapPhoto(page, high!);
    await page.getByLabel('Made visible by').selectOption('p-anisaldehyde');
    await fillFacts(page);
    await keepPicture(page, 'plate-phone');
    expect(await seriousFindings(page)).toEqual([]);
    expect(await scrollsSideways(page)).toBe(false);
    await save(page).tap();
    const plate = await savedPlate(page);
    expect(plate.lanes[0]!.spots).toHaveLength(2);
    const rfs = plate.lanes[0]!.spots.map((one) => one.rf);
    // A finger on a phone of 360 px, with a straight line for the curved front.
    expect(Math.abs(rfs[0]! - low!.rf)).toBeLessThan(0.03);
    expect(Math.abs(rfs[1]! - high!.rf)).toBeLessThan(0.03);
    await page
      .getByText(/^Areas in this lane/)
      .first()
      .waitFor();
    await page.emulateMedia({ colorScheme: 'dark' });
    await keepPicture(page, 'plate-saved-phone-dark');
    expect(await seriousFindings(page)).toEqual([]);
    expect(await scrollsSideways(page)).toBe(false);
    await context.close();
  });

  it('by keyboard alone: set, move by arrows, take away, undo, enlarge, accept, save', async () => {
    const { context, page, path } = await openFresh(desk, uv);
    const keys = async (...names: string[]) => {
      for (const name of names) await page.keyboard.press(name);
    };
    const focused = () => page.evaluate(() => document.activeElement?.getAttribute('aria-label') ?? '');
    /** Tab until something with this name has the focus. */
    async function tabTo(name: RegExp) {
      for (let step = 0; step < 120; step += 1) {
        const here = await page.evaluate(() => {
          const one = document.activeElement;
          return one?.getAttribute('aria-label') ?? one?.textContent ?? '';
        });
        if (name.test(here)) return;
        await page.keyboard.press('Tab');
      }
      throw new Error(`Tab never came to ${name}`);
    }
    await tabTo(/^Baseline$/);
    await keys('Enter');
    await tabTo(/^Set without pointing$/);
    await keys('Enter');
    await expect.poll(focused).toMatch(/^Baseline, point 1/);
    const yOf = async () =>
      Number(
        /translate\(\S+ (\S+)\)/.exec((await mark(page, 'Baseline, point 1').getAttribute('transform'))!)![1],
      );
    const before = await yOf();
    await keys('ArrowDown', 'Shift+ArrowDown');
    expect((await yOf()) - before).toBe(11);
    await keys('Delete');
    expect(await mark(page, 'Baseline, point 1').count()).toBe(0);
    await keys('Control+z');
    await mark(page, 'Baseline, point 1').waitFor();
    // The keys enlarge the photo wherever the focus is in it.
    await tabTo(/^Baseline, point 1$/);
    await keys('+');
    await page.getByText('150 %', { exact: true }).waitFor();
    await keys('0');
    await page.getByText('100 %', { exact: true }).waitFor();

    await openMarking(page, path);
    await page.locator('body').focus();
    await tabTo(/^Discard them$/);
    await keys('Enter');
    await tabTo(/^Propose marks$/);
    await keys('Enter');
    await mark(page, /^Top left corner, proposed \(.*, \d+ %\), Enter accepts it$/).waitFor();
    await tabTo(/^Top left corner, proposed/);
    await keys('Enter');
    await expect.poll(focused).toBe('Top left corner');
    await keys('Shift+Tab');
    await page.getByRole('button', { name: 'Accept all' }).focus();
    await keys('Enter');
    await page.getByLabel('Stationary phase').focus();
    await page.keyboard.type('silica gel 60 F254');
    await keys('Tab');
    await page.keyboard.type('toluene');
    const lanes = await page.getByLabel('Holds').all();
    for (const holds of lanes) {
      await holds.focus();
      await page.keyboard.type('crude');
    }
    await page.getByLabel('Note').focus();
    await tabTo(/^Save the plate$/);
    await keys('Enter');
    const plate = await savedPlate(page);
    expect(expectTrueRf(plate, uv)).toBe(spotsOf(uv).length);
    await context.close();
  });
});

describe('marks that are not saved', () => {
  it('survive a reload, and are offered and not forced', async () => {
    const { context, page } = await openFresh(desk, uv);
    await modeButton(page, 'Lane').click();
    await clickPhoto(page, spotsOf(uv)[0]!);
    await page.getByLabel('Eluent').fill('toluene');
    // The draft is written a moment after the last change.
    await page.waitForTimeout(600);
    await page.reload();
    await page.getByRole('button', { name: 'Take them up again' }).click();
    await mark(page, 'Lane 1').waitFor();
    expect(await page.getByLabel('Eluent').inputValue()).toBe('toluene');
    await context.close();
  });

  async function markByProposal(page: Page) {
    await page.getByRole('button', { name: 'Propose marks' }).click();
    await page.getByRole('button', { name: 'Accept all' }).click();
    await fillFacts(page);
  }

  it('wait without network, and are sent once when it is back', async () => {
    const { context, page, evidenceId } = await openFresh(desk, uv);
    await markByProposal(page);
    await context.setOffline(true);
    await save(page).click();
    await page.getByText('Waiting for the network: these marks').waitFor();
    await page.getByRole('button', { name: 'Try now' }).click();
    await page.getByText('Waiting for the network: these marks').waitFor();
    await keepPicture(page, 'plate-waiting-desk');
    expect(await seriousFindings(page)).toEqual([]);
    expect(await platesOf(evidenceId)).toEqual([]);
    await context.setOffline(false);
    await savedPlate(page);
    expect(await platesOf(evidenceId)).toHaveLength(1);
    await context.close();
  });

  it('are sent by the next page that is opened, and never twice though the answer was lost', async () => {
    const { context, page, evidenceId, path } = await openFresh(desk, uv);
    await markByProposal(page);
    let arrived = 0;
    // The server does it, but its answer never comes back.
    await page.route(`**/api/v1/runs/${runCode}/plates`, async (route) => {
      arrived += 1;
      await route.fetch();
      await route.abort('connectionreset');
    });
    await save(page).click();
    await page.getByText('Waiting for the network: these marks').waitFor();
    expect(arrived).toBeGreaterThan(0);
    await page.close();
    // Any page that takes photos of plates sends them.
    const next = await context.newPage();
    await next.goto(path.split('?')[0]!);
    await next.getByText('Sent: the marks on plate.jpg').waitFor();
    await next.getByRole('link', { name: 'Look at the plate' }).click();
    await savedPlate(next);
    expect(await platesOf(evidenceId)).toHaveLength(1);
    await context.close();
  });

  it('that the server refuses stay on the device, with its words', async () => {
    const { context, page, evidenceId } = await openFresh(desk, uv);
    await markByProposal(page);
    const other = await openContext(desk);
    await page.route(`**/api/v1/runs/${runCode}/plates`, (route) =>
      route.fulfill({
        status: 422,
        contentType: 'application/problem+json',
        body: JSON.stringify({ detail: 'The eluent is not understood.', errors: [] }),
      }),
    );
    await save(page).click();
    await page.getByText('Refused: these marks').waitFor();
    await page.getByText(/The eluent is not understood/).waitFor();
    await page.unroute(`**/api/v1/runs/${runCode}/plates`);
    await page.getByRole('button', { name: 'Send them again' }).click();
    await savedPlate(page);
    expect(await platesOf(evidenceId)).toHaveLength(1);
    await other.context.close();
    await context.close();
  });
});

describe('two photos of one plate', () => {
  it('show the spots of each in the other, and share lines and lanes', async () => {
    const marks = trueMarks(uv);
    const uvId = await sendPlatePhoto(agent, runCode, uv.jpeg);
    const { body } = await agent
      .post(`/api/v1/runs/${runCode}/plates`)
      .send({
        evidenceId: uvId,
        stationaryPhase: 'silica gel 60 F254',
        eluent: 'toluene',
        visualiser: 'uv-254',
        widthMm: 50,
        heightMm: 100,
        ...marks,
        lanes: marks.lanes.map((lane, l) => ({
          ...lane,
          label: `${l + 1}`,
          subject:
            l === 2 ? { kind: 'fraction', code: `${runCode}-F1` } : { kind: l === 3 ? 'reference' : 'crude' },
        })),
      })
      .expect(201);
    const stainedId = await sendPlatePhoto(agent, runCode, stained.jpeg);
    const { context } = await openContext(desk);
    const page = await context.newPage();
    await signInOnPage(page, credentials());
    await openMarking(page, `/plates/${body.id}?photo=${uvId}`);
    await page.getByRole('heading', { name: 'Against the references' }).waitFor();
    await page.getByRole('heading', { name: 'Before and after' }).waitFor();
    expect(await page.getByRole('link', { name: 'Report' }).getAttribute('href')).toBe(
      `/plates/${body.id}/report`,
    );
    await keepPicture(page, 'plate-answers-desk');

    await openMarking(page, `/plates/${body.id}?photo=${stainedId}`);
    await modeButton(page, 'Corners').click();
    for (const corner of cornersOf(stained)) await clickPhoto(page, corner);
    const ghosts = page.locator('[data-part="ghosts"] > g');
    await expect.poll(() => ghosts.count()).toBe(spotsOf(uv).length);
    const truth = spotsOf(stained).map(({ x, y }) => ({ x, y }));
    for (const [index, at] of truth.entries()) {
      const [, x, y] = /translate\((\S+) (\S+)\)/.exec((await ghosts.nth(index).getAttribute('transform'))!)!;
      // The corners were pressed at 900 px shown in about 500.
      expect(Math.hypot(Number(x) - at.x, Number(y) - at.y)).toBeLessThan(6);
    }
    await page.getByRole('button', { name: 'Take lines and lanes from UV 254 nm' }).click();
    await modeButton(page, 'Spot').click();
    for (const spot of truth) await clickPhoto(page, spot);
    await page.getByLabel('Made visible by').selectOption('p-anisaldehyde');
    await keepPicture(page, 'plate-second-photo-desk');
    await page.getByRole('button', { name: 'Save the changed marks' }).click();
    await page.waitForURL(/saved=/);
    await page.waitForFunction(() => document.title !== '');
    const after = (await agent.get(`/api/v1/plates/${body.id}`).expect(200)).body as PlateView;
    expect(after.photos).toHaveLength(2);
    expect(after.distinctSpots.flatMap((lane) => lane.spots)).toHaveLength(spotsOf(uv).length);
    expect(await seriousFindings(page)).toEqual([]);
    await context.close();
  });
});
