import { Agent, get } from 'node:http';
import { json } from 'node:stream/consumers';
import { database } from '@/lib/database/connection';
import { type FractionRow, fractionListQuery } from '@/lib/distillation/fraction-schema';
import { listFractions } from '@/lib/distillation/list-fractions';
import type { UserActor } from '@/lib/auth/actor';
import type { BenchRow } from '../bench-row';
import { loadFractions } from '../load-fractions';
import { compare, msText, percentile } from '../measure';
import { signIn } from '../sign-in';

const count = 10_000;
const rowsAPage = 50;
const repetitions = 300;

/** The very text of the list's query: what the app sends to MariaDB for this page. */
async function readSqlOfPage(actor: UserActor): Promise<string> {
  const sent: string[] = [];
  // Sequelize's types leave out the options that each of its queries starts from.
  const { options } = database() as unknown as { options: { logging: false | ((text: string) => void) } };
  options.logging = (text) => void sent.push(text);
  try {
    await listFractions(actor, fractionListQuery.parse({ limit: rowsAPage }));
  } finally {
    options.logging = false;
  }
  const [first] = sent;
  if (sent.length !== 1 || !first) throw new Error(`The page took ${sent.length} queries; one was expected.`);
  return first.replace(/^Execut(?:ing|ed) \([^)]*\): /, '');
}

function getPage(url: string, cookie: string, agent: Agent): Promise<{ items: FractionRow[] }> {
  return new Promise((resolve, reject) => {
    get(url, { agent, headers: { cookie }, timeout: 20_000 }, (response) => {
      if (response.statusCode !== 200) reject(new Error(`${url} answered ${response.statusCode}.`));
      json(response).then((body) => resolve(body as { items: FractionRow[] }), reject);
    }).once('error', reject);
  });
}

export const row: BenchRow = {
  name: 'fractions-page',
  async measure(bench) {
    const app = await bench.app();
    const { group, person, actor } = await bench.laboratory();
    const connection = await bench.database();
    const loading = performance.now();
    await loadFractions(connection, { count, groupId: group.id, chemistId: person.id });
    const loadedInMs = performance.now() - loading;
    const cookie = await signIn(app.url, person);
    const sql = await readSqlOfPage(actor);
    const agent = new Agent({ keepAlive: true, maxSockets: 1 });
    const url = `${app.url}/api/v1/fractions?limit=${rowsAPage}`;
    try {
      const [page, bare] = await Promise.all([
        getPage(url, cookie, agent),
        connection.query<{ code: string }[]>(sql),
      ]);
      const codes = [page.items, bare.slice(0, rowsAPage)].map((rows) => rows.map(({ code }) => code).join());
      if (page.items.length !== rowsAPage || codes[0] !== codes[1])
        throw new Error('The page and the bare query gave different fractions.');
      const result = await compare(
        async () => void (await getPage(url, cookie, agent)),
        async () => void (await connection.query(sql)),
        { repetitions, warmUps: 30 },
      );
      return [
        {
          what: `first ${rowsAPage} of ${count.toLocaleString('en').replace(',', ' ')} fractions over HTTP ÷ the same SQL`,
          measured: msText(result.measured),
          baseline: msText(result.baseline),
          ratio: result.ratio,
          note: `Medians of ${result.repetitions}; 95 % of the pages within ${msText(percentile(result.measuredAll, 0.95))}. The data were loaded in ${msText(loadedInMs)}.`,
        },
      ];
    } finally {
      agent.destroy();
    }
  },
};
