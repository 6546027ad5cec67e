import { afterAll, describe, expect, it } from 'vitest';
import { buildGroup, buildUser } from '../factories/records';
import { closeBrowser, openContext, phone, seriousFindings } from '../support/browser';
import { stopTestServer, testServer } from '../support/test-server';

afterAll(async () => {
  await closeBrowser();
  await stopTestServer();
});

describe('signing in on a page', () => {
  it.each([
    '/\t/evil.invalid',
    '//evil.invalid',
    '/\\evil.invalid',
    'https://evil.invalid/',
    'javascript:alert(1)',
  ])('never leads to another site: %j', async (next) => {
    const { url } = await testServer();
    const user = await buildUser({ group: await buildGroup(), roles: ['chemist'] });
    const { context, offSite } = await openContext(phone);
    const page = await context.newPage();
    await page.goto(`/sign-in?next=${encodeURIComponent(next)}`);
    expect(await seriousFindings(page)).toEqual([]);
    await page.getByLabel('E-mail').fill(user.email);
    await page.getByLabel('Password').fill(user.plainPassword);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.waitForURL((address) => !address.pathname.startsWith('/sign-in'));
    expect(new URL(page.url()).origin).toBe(url);
    expect(offSite).toEqual([]);
    await context.close();
  });

  it('leads to the page that was asked for', async () => {
    const user = await buildUser({ group: await buildGroup(), roles: ['chemist'] });
    const { context } = await openContext(phone);
    const page = await context.newPage();
    await page.goto('/fractions?cut=heart');
    await page.waitForURL(/\/sign-in\?next=/);
    await page.getByLabel('E-mail').fill(user.email);
    await page.getByLabel('Password').fill(user.plainPassword);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.waitForURL('**/fractions?cut=heart');
    await context.close();
  });
});
