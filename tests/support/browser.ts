import { createRequire } from 'node:module';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';
import { testServer } from './test-server';

const executablePath = process.env.CHROMIUM ?? '/usr/bin/chromium';
const args = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

let browser: Browser | undefined;

export const phone = { viewport: { width: 360, height: 740 }, hasTouch: true, isMobile: true };
export const desk = { viewport: { width: 1280, height: 900 } };

/** A fresh browser profile on the test server; requests that leave this machine fail the test's `offSite` list. */
export async function openContext(
  options: Parameters<Browser['newContext']>[0] = desk,
): Promise<{ context: BrowserContext; offSite: string[] }> {
  browser ??= await chromium.launch({ executablePath, args });
  const { url } = await testServer();
  const context = await browser.newContext({ baseURL: url, ...options });
  context.setDefaultTimeout(20_000);
  const offSite: string[] = [];
  context.on('request', (request) => {
    if (!request.url().startsWith(url) && !/^(data|blob):/.test(request.url())) offSite.push(request.url());
  });
  return { context, offSite };
}

export async function closeBrowser(): Promise<void> {
  await browser?.close();
  browser = undefined;
}

/** Signs in by the form, as a person does. */
export async function signInOnPage(
  page: Page,
  { email, password }: { email: string; password: string },
): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL('**/bench');
}

const axePath = createRequire(import.meta.url).resolve('axe-core/axe.min.js');

/** What axe finds serious or critical on the page as it stands, as `rule: selector`. WCAG 2.2 A and AA. */
export async function seriousFindings(page: Page): Promise<string[]> {
  // The page's policy forbids foreign scripts, so axe comes in by the debugging protocol.
  const { readFileSync } = await import('node:fs');
  await page.evaluate(readFileSync(axePath, 'utf8'));
  const results = await page.evaluate(async () => {
    const axe = (
      window as unknown as {
        axe: {
          run: (
            root: Document,
            options: object,
          ) => Promise<{ violations: { id: string; impact: string; nodes: { target: string[] }[] }[] }>;
        };
      }
    ).axe;
    return axe.run(document, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] });
  });
  return results.violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, nodes }) => nodes.map((node) => `${id}: ${node.target.join(' ')}`));
}

/** Whether the page can be scrolled sideways, which no page should at phone width. */
export async function scrollsSideways(page: Page): Promise<boolean> {
  return page.evaluate(() => document.documentElement.scrollWidth > document.documentElement.clientWidth + 1);
}

/** Keeps a picture of the page for people to look at, under the state folder. */
export async function keepPicture(page: Page, name: string): Promise<void> {
  const folder = join(process.env.HEARTCUT_HOME ?? '.local-test', 'pictures');
  mkdirSync(folder, { recursive: true });
  await page.screenshot({ path: join(folder, `${name}.png`), fullPage: true });
}
