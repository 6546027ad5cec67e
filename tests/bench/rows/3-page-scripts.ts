import type { Bench } from '../bench';
import type { BenchRow, Figure } from '../bench-row';
import { launchBrowser, transferredScriptBytes } from '../page-scripts';
import { makePlate, makeTrace } from '../records-to-show';
import { signIn } from '../sign-in';

const baselinePage = 'sign-in';
type Page = { name: string; path: string; signedIn: boolean };

/** The pages that are measured, with records to show on them. */
async function listPages(bench: Bench, url: string, cookie: string): Promise<Page[]> {
  const laboratory = await bench.laboratory();
  const { run, fraction } = laboratory;
  const plateId = await makePlate({ url, cookie }, laboratory);
  const traceId = await makeTrace({ url, cookie }, laboratory);
  const paths = {
    bench: '/bench',
    runs: '/runs',
    run: `/runs/${run.code}`,
    fractions: '/fractions',
    fraction: `/fractions/${fraction.code}`,
    compounds: '/compounds',
    'still planner': '/still-planner',
    'plate marking': `/plates/${plateId}`,
    trace: `/traces/${traceId}`,
  };
  const pages = Object.entries(paths).map(([name, path]) => ({ name, path, signedIn: true }));
  return [{ name: baselinePage, path: '/sign-in', signedIn: false }, ...pages];
}

const kB = (bytes: number) => `${(bytes / 1000).toFixed(0)} kB`;

export const row: BenchRow = {
  name: 'page-scripts',
  async measure(bench) {
    const app = await bench.app();
    const { person } = await bench.laboratory();
    const cookie = await signIn(app.url, person);
    const pages = await listPages(bench, app.url, cookie);
    const browser = await launchBrowser();
    const figures: Figure[] = [];
    let baseline = 0;
    try {
      for (const { name, path, signedIn } of pages) {
        const visit = { url: app.url, path, cookie: signedIn ? cookie : '' };
        const { status, landed, bytes, scripts } = await transferredScriptBytes(browser, visit);
        if (name === baselinePage) baseline = bytes;
        const what = `first-load script: ${name} ÷ ${baselinePage}`;
        const shown = status === 200 && landed === path;
        figures.push(
          shown
            ? {
                what,
                measured: `${kB(bytes)} in ${scripts}`,
                baseline: kB(baseline),
                ratio: bytes / baseline,
              }
            : {
                what,
                measured: '-',
                baseline: kB(baseline),
                ratio: null,
                note: `${path.split('/')[1]}: the page answered ${status}${landed === path ? '' : ` and led to ${landed}`}.`,
              },
        );
      }
    } finally {
      await browser.close();
    }
    return figures;
  },
};
