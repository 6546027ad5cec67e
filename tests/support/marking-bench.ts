import { expect } from 'vitest';
import type { Page } from 'playwright-core';
import type { PlateView } from '@/lib/evidence/tlc/schema';
import { photographPlate, sendPlatePhoto, tiltedScene, views } from '../factories/marked-plate';
import type { RenderedPlate } from '../factories/plate-renderer/render-plate';
import { buildEthylAcetate, buildFraction, buildGroup, buildRun, buildUser } from '../factories/records';
import { openContext, signInOnPage } from './browser';
import { openMarking } from './marking-page';
import { signedIn, testServer } from './test-server';

/** A chemist with a run and two photos of one invented plate: green under UV, and pale after a stain. */
export async function openMarkingBench() {
  await testServer();
  const group = await buildGroup();
  const run = await buildRun({ group, target: await buildEthylAcetate() });
  await buildFraction({ run });
  const person = await buildUser({ group, roles: ['chemist'] });
  const credentials = { email: person.email, password: person.plainPassword };
  const agent = await signedIn(credentials);
  const uv = await photographPlate(tiltedScene, views.tilted);
  const stained = await photographPlate({ ...tiltedScene, look: 'anisaldehyde' }, views.otherwise);

  /** A photo that nobody has marked, open for marking by the signed-in chemist. */
  async function openFresh(options: Parameters<typeof openContext>[0], photo: RenderedPlate) {
    const evidenceId = await sendPlatePhoto(agent, run.code, photo.jpeg);
    const { context, offSite } = await openContext(options);
    const page = await context.newPage();
    await signInOnPage(page, credentials);
    const path = `/runs/${run.code}/plates/new?photo=${evidenceId}`;
    await openMarking(page, path);
    return { context, page, evidenceId, path, offSite };
  }
  /** The plate that the page has come to after a save. */
  async function savedPlate(page: Page): Promise<PlateView> {
    await page.waitForURL(/\/plates\/[0-9a-f-]{36}/);
    const id = /\/plates\/([0-9a-f-]{36})/.exec(page.url())![1];
    return (await agent.get(`/api/v1/plates/${id}`).expect(200)).body as PlateView;
  }
  async function platesOf(evidenceId: string): Promise<PlateView[]> {
    const { body } = await agent.get(`/api/v1/runs/${run.code}/plates?limit=200`).expect(200);
    return (body.items as PlateView[]).filter((plate) => plate.evidenceId === evidenceId);
  }
  return { runCode: run.code, credentials, agent, uv, stained, openFresh, savedPlate, platesOf };
}
export type MarkingBench = Awaited<ReturnType<typeof openMarkingBench>>;

/** Every true spot has a marked one within 0.01 of its Rf; answers how many are marked. */
export function expectTrueRf(plate: PlateView, photo: RenderedPlate): number {
  const found = plate.lanes.flatMap((lane) => lane.spots.map((spot) => spot.rf));
  const truth = photo.truth.lanes.flatMap((lane) => lane.spots.map((spot) => spot.rf));
  truth.forEach((rf) => expect(Math.min(...found.map((one) => Math.abs(one - rf)))).toBeLessThan(0.01));
  return found.length;
}

/** A mark on the photo, by its name. */
export const mark = (page: Page, name: string | RegExp) =>
  page.getByRole('group', { name: /^Plate photo/ }).getByRole('button', { name });
export const saveButton = (page: Page) => page.getByRole('button', { name: 'Save the plate' });
export const cornersOf = ({ truth }: RenderedPlate) => truth.corners;
export const spotsOf = ({ truth }: RenderedPlate) => truth.lanes.flatMap((lane) => lane.spots);
