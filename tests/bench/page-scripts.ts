import { type Browser, chromium } from 'playwright-core';
import { findProgram } from '../../docker-local/commands.mjs';

/** A script that waits for nobody: what the page asked for is there by then. */
const quietMs = 500;
const patienceMs = 20_000;

export async function launchBrowser(): Promise<Browser> {
  const executablePath = findProgram('chromium');
  if (!executablePath) throw new Error('Chromium is missing. As root: apt-get install -y chromium');
  const args = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run'];
  const quiet = ['--disable-background-networking', '--disable-component-update', '--disable-sync'];
  return chromium.launch({ executablePath, args: [...args, ...quiet] });
}

/**
 * Bytes of script, as they came compressed over the wire, that a first visit to a page costs: an empty cache,
 * everything until the network is quiet. Pages that the router only fetches in advance are left out.
 */
export async function transferredScriptBytes(
  browser: Browser,
  { url, path, cookie }: { url: string; path: string; cookie: string },
): Promise<{ status: number; landed: string; bytes: number; scripts: number }> {
  const context = await browser.newContext();
  try {
    await context.addCookies(
      cookie
        .split('; ')
        .filter((pair) => pair.includes('='))
        .map((pair) => ({
          name: pair.slice(0, pair.indexOf('=')),
          value: pair.slice(pair.indexOf('=') + 1),
          url,
        })),
    );
    const page = await context.newPage();
    await page.route('**/*', (route) =>
      'next-router-prefetch' in route.request().headers() ? route.abort() : route.continue(),
    );
    const sizes: Promise<number>[] = [];
    page.on('requestfinished', (request) => {
      if (request.resourceType() === 'script')
        sizes.push(request.sizes().then(({ responseBodySize }) => responseBodySize));
    });
    const response = await page.goto(url + path, { waitUntil: 'networkidle', timeout: patienceMs });
    await page.waitForTimeout(quietMs);
    const bytes = (await Promise.all(sizes)).reduce((sum, size) => sum + size, 0);
    const landed = new URL(page.url()).pathname;
    return { status: response?.status() ?? 0, landed, bytes, scripts: sizes.length };
  } finally {
    await context.close();
  }
}
