import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { closeBrowser, desk, keepPicture, seriousFindings } from '../support/browser';
import { mark, type MarkingBench, openMarkingBench, saveButton, spotsOf } from '../support/marking-bench';
import { clickPhoto, fillFacts, modeButton } from '../support/marking-page';
import { stopTestServer } from '../support/test-server';

let bench: MarkingBench;

beforeAll(async () => {
  bench = await openMarkingBench();
});
afterAll(async () => {
  await closeBrowser();
  await stopTestServer();
});

describe('marks that are not saved', () => {
  it('survive a reload, and are offered and not forced', async () => {
    const { context, page } = await bench.openFresh(desk, bench.uv);
    await modeButton(page, 'Lane').click();
    await clickPhoto(page, spotsOf(bench.uv)[0]!);
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
    const { context, page, evidenceId } = await bench.openFresh(desk, bench.uv);
    await markByProposal(page);
    await context.setOffline(true);
    await saveButton(page).click();
    await page.getByText('Waiting for the network: these marks').waitFor();
    await page.getByRole('button', { name: 'Try now' }).click();
    await page.getByText('Waiting for the network: these marks').waitFor();
    await keepPicture(page, 'plate-waiting-desk');
    expect(await seriousFindings(page)).toEqual([]);
    expect(await bench.platesOf(evidenceId)).toEqual([]);
    await context.setOffline(false);
    await bench.savedPlate(page);
    expect(await bench.platesOf(evidenceId)).toHaveLength(1);
    await context.close();
  });

  it('are sent by the next page that is opened, and never twice though the answer was lost', async () => {
    const { context, page, evidenceId, path } = await bench.openFresh(desk, bench.uv);
    await markByProposal(page);
    let arrived = 0;
    // The server does it, but its answer never comes back.
    await page.route(`**/api/v1/runs/${bench.runCode}/plates`, async (route) => {
      arrived += 1;
      await route.fetch();
      await route.abort('connectionreset');
    });
    await saveButton(page).click();
    await page.getByText('Waiting for the network: these marks').waitFor();
    expect(arrived).toBeGreaterThan(0);
    await page.close();
    // Any page that takes photos of plates sends them.
    const next = await context.newPage();
    await next.goto(path.split('?')[0]!);
    await next.getByText('Sent: the marks on plate.jpg').waitFor();
    await next.getByRole('link', { name: 'Look at the plate' }).click();
    await bench.savedPlate(next);
    expect(await bench.platesOf(evidenceId)).toHaveLength(1);
    await context.close();
  });

  it('that the server refuses stay on the device, with its words', async () => {
    const { context, page, evidenceId } = await bench.openFresh(desk, bench.uv);
    await markByProposal(page);
    await page.route(`**/api/v1/runs/${bench.runCode}/plates`, (route) =>
      route.fulfill({
        status: 422,
        contentType: 'application/problem+json',
        body: JSON.stringify({ detail: 'The eluent is not understood.', errors: [] }),
      }),
    );
    await saveButton(page).click();
    await page.getByText('Refused: these marks').waitFor();
    await page.getByText(/The eluent is not understood/).waitFor();
    await page.unroute(`**/api/v1/runs/${bench.runCode}/plates`);
    await page.getByRole('button', { name: 'Send them again' }).click();
    await bench.savedPlate(page);
    expect(await bench.platesOf(evidenceId)).toHaveLength(1);
    await context.close();
  });
});
