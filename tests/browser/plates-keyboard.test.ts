import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { closeBrowser, desk } from '../support/browser';
import { expectTrueRf, mark, type MarkingBench, openMarkingBench, spotsOf } from '../support/marking-bench';
import { openMarking } from '../support/marking-page';
import { stopTestServer } from '../support/test-server';

let bench: MarkingBench;

beforeAll(async () => {
  bench = await openMarkingBench();
});
afterAll(async () => {
  await closeBrowser();
  await stopTestServer();
});

describe('marking by hand', () => {
  it('by keyboard alone: set, move by arrows, take away, undo, enlarge, accept, save', async () => {
    const { context, page, path } = await bench.openFresh(desk, bench.uv);
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
    await page.getByRole('button', { name: 'Discard them' }).waitFor();
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
    const plate = await bench.savedPlate(page);
    expect(expectTrueRf(plate, bench.uv)).toBe(spotsOf(bench.uv).length);
    await context.close();
  });
});
