import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { PlateView } from '@/lib/evidence/tlc/schema';
import { sendPlatePhoto, trueMarks } from '../factories/marked-plate';
import {
  closeBrowser,
  desk,
  keepPicture,
  openContext,
  seriousFindings,
  signInOnPage,
} from '../support/browser';
import { cornersOf, type MarkingBench, openMarkingBench, spotsOf } from '../support/marking-bench';
import { clickPhoto, modeButton, openMarking } from '../support/marking-page';
import { stopTestServer } from '../support/test-server';

let bench: MarkingBench;

beforeAll(async () => {
  bench = await openMarkingBench();
});
afterAll(async () => {
  await closeBrowser();
  await stopTestServer();
});

describe('two photos of one plate', () => {
  it('show the spots of each in the other, and share lines and lanes', async () => {
    const marks = trueMarks(bench.uv);
    const uvId = await sendPlatePhoto(bench.agent, bench.runCode, bench.uv.jpeg);
    const { body } = await bench.agent
      .post(`/api/v1/runs/${bench.runCode}/plates`)
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
            l === 2
              ? { kind: 'fraction', code: `${bench.runCode}-F1` }
              : { kind: l === 3 ? 'reference' : 'crude' },
        })),
      })
      .expect(201);
    const stainedId = await sendPlatePhoto(bench.agent, bench.runCode, bench.stained.jpeg);
    const { context } = await openContext(desk);
    const page = await context.newPage();
    await signInOnPage(page, bench.credentials);
    await openMarking(page, `/plates/${body.id}?photo=${uvId}`);
    await page.getByRole('heading', { name: 'Against the references' }).waitFor();
    await page.getByRole('heading', { name: 'Before and after' }).waitFor();
    expect(await page.getByRole('link', { name: 'Report' }).getAttribute('href')).toBe(
      `/plates/${body.id}/report`,
    );
    await keepPicture(page, 'plate-answers-desk');

    await openMarking(page, `/plates/${body.id}?photo=${stainedId}`);
    await modeButton(page, 'Corners').click();
    for (const corner of cornersOf(bench.stained)) await clickPhoto(page, corner);
    const ghosts = page.locator('[data-part="ghosts"] > g');
    await expect.poll(() => ghosts.count()).toBe(spotsOf(bench.uv).length);
    const truth = spotsOf(bench.stained).map(({ x, y }) => ({ x, y }));
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
    const after = (await bench.agent.get(`/api/v1/plates/${body.id}`).expect(200)).body as PlateView;
    expect(after.photos).toHaveLength(2);
    expect(after.distinctSpots.flatMap((lane) => lane.spots)).toHaveLength(spotsOf(bench.uv).length);
    expect(await seriousFindings(page)).toEqual([]);
    await context.close();
  });
});
