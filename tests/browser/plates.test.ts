import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { trueMarks } from '../factories/marked-plate';
import { closeBrowser, desk, keepPicture, phone, scrollsSideways, seriousFindings } from '../support/browser';
import {
  cornersOf,
  expectTrueRf,
  mark,
  type MarkingBench,
  openMarkingBench,
  saveButton,
  spotsOf,
} from '../support/marking-bench';
import {
  clickPhoto,
  fillFacts,
  modeButton,
  moveFingers,
  onScreen,
  tapPhoto,
  wayOf,
} from '../support/marking-page';
import { stopTestServer } from '../support/test-server';

let bench: MarkingBench;

beforeAll(async () => {
  bench = await openMarkingBench();
});
afterAll(async () => {
  await closeBrowser();
  await stopTestServer();
});

describe('a proposal', () => {
  it('is shown as one, accepted, moved and taken away mark by mark, and stays in the record', async () => {
    const { context, page, offSite } = await bench.openFresh(desk, bench.uv);
    await page.getByRole('button', { name: 'Propose marks' }).click();
    await page.getByText(/^Decide the \d+ proposed marks one by one$/).waitFor();
    await keepPicture(page, 'plate-proposed-desk');
    expect(await seriousFindings(page)).toEqual([]);
    await page.getByText(/^Decide the/).click();
    await page.getByRole('button', { name: 'Accept: Top left corner' }).click();
    await mark(page, /^Top left corner$/).waitFor();
    await fillFacts(page);
    // Nothing is saved unseen: the page asks.
    await saveButton(page).click();
    const question = page.getByRole('dialog', { name: /Save without the \d+ marks/ });
    await question.getByText(/Mark all four corners/).waitFor();
    await question.getByRole('button', { name: 'Look at them again' }).click();
    expect(await mark(page, /proposed \(/).count()).toBeGreaterThan(0);
    const [first] = spotsOf(bench.uv);
    await clickPhoto(page, first!);
    await page.getByRole('button', { name: 'Take it away' }).click();
    expect(await mark(page, /, spot/).count()).toBe(spotsOf(bench.uv).length - 1);
    await page.getByRole('button', { name: 'Undo', exact: true }).click();
    await page.getByRole('button', { name: 'Accept all' }).click();
    await page.getByText('No proposed mark is left to decide.').waitFor();
    await keepPicture(page, 'plate-accepted-desk');
    await saveButton(page).click();
    const plate = await bench.savedPlate(page);
    expect(expectTrueRf(plate, bench.uv)).toBe(spotsOf(bench.uv).length);
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
    const { context, page } = await bench.openFresh(desk, bench.uv);
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
    await clickPhoto(page, spotsOf(bench.uv)[0]!);
    await mark(page, /^Lane 1$/).waitFor();
    await context.close();
  });
});

describe('marking by hand', () => {
  it('by mouse: corners, lines, lanes and spots; press to choose, press to place; drag; undo and redo', async () => {
    const { context, page } = await bench.openFresh(desk, bench.uv);
    const marks = trueMarks(bench.uv);
    await modeButton(page, 'Corners').click();
    for (const index of [2, 0, 3, 1]) await clickPhoto(page, cornersOf(bench.uv)[index]!);
    await modeButton(page, 'Baseline').click();
    for (const point of marks.baseline) await clickPhoto(page, point);
    await modeButton(page, 'Front').click();
    for (const point of marks.front) await clickPhoto(page, point);
    await modeButton(page, 'Lane').click();
    for (const lane of bench.uv.truth.lanes) await clickPhoto(page, { x: lane.x, y: lane.y - 25 });
    await modeButton(page, 'Spot').click();
    const [first, ...others] = spotsOf(bench.uv);
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
    await saveButton(page).click();
    const plate = await bench.savedPlate(page);
    expect(expectTrueRf(plate, bench.uv)).toBe(spotsOf(bench.uv).length);
    expect(plate.corners).toHaveLength(4);
    expect(plate.flags).not.toContain('perspective not corrected');
    expect(plate.photos[0]!.proposal).toBeNull();
    await context.close();
  });

  it('by touch on a phone: tap, drag under the loupe, zoom by two fingers, tap to place', async () => {
    const { context, page } = await bench.openFresh(phone, bench.stained);
    const marks = trueMarks(bench.stained);
    await modeButton(page, 'Corners').tap();
    for (const corner of cornersOf(bench.stained)) await tapPhoto(page, corner);
    await mark(page, 'Bottom left corner').waitFor();
    await modeButton(page, 'Baseline').tap();
    for (const point of marks.baseline) await tapPhoto(page, point);
    await modeButton(page, 'Front').tap();
    await tapPhoto(page, marks.front[0]!);
    await tapPhoto(page, marks.front.at(-1)!);
    await modeButton(page, 'Lane').tap();
    const [lane] = bench.stained.truth.lanes;
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
    await saveButton(page).tap();
    const plate = await bench.savedPlate(page);
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
});
