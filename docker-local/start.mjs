import { join, relative } from 'node:path';
import { ensureBuild, markServed } from './build.mjs';
import { migrateAndSeed } from './database-content.mjs';
import { buildEnvironment } from './environment.mjs';
import { chooseFreePort, readWantedAddress } from './free-port.mjs';
import { installDependencies } from './install-dependencies.mjs';
import { findJson } from './json-file.mjs';
import { homeFolder, ROOT } from './places.mjs';
import { runUntilStopped } from './run-until-stopped.mjs';
import { serveApp } from './serve-app.mjs';
import { ensureServices, releaseServices } from './services.mjs';

const home = homeFolder();
let held = false;

/**
 * @param {string} url
 * @param {import('./services.mjs').ServiceFacts} facts
 */
function printWelcome(url, facts) {
  const lines = [`\nHeartcut is ready: ${url}\n`];
  if ((process.env.HEARTCUT_DEMO || '1') === '1') {
    const accounts = findJson(join(ROOT, 'seeders', 'demo-accounts.json')) ?? [];
    lines.push(`Demo accounts (invented people), password ${accounts[0]?.password}:`);
    for (const account of accounts) lines.push(`  ${account.email.padEnd(28)} ${account.role}`);
  }
  if (facts.mail) {
    lines.push(
      `\nMail lands in ${relative(process.cwd(), join(home, 'mail')) || '.'}; read it at http://127.0.0.1:${facts.mail.inboxPort}`,
    );
  }
  lines.push(`State is kept in ${home}. Stop with Ctrl-C.\n`);
  console.log(lines.join('\n'));
}

await runUntilStopped({
  async work(stop) {
    let stopped = false;
    void stop.then(() => (stopped = true));
    const wanted = readWantedAddress();
    await installDependencies();
    if (stopped) return 0;
    held = true;
    const facts = await ensureServices({ home, hold: true });
    if (stopped) return 0;
    const plain = buildEnvironment(facts, wanted);
    await migrateAndSeed(home, plain);
    const folder = await ensureBuild(['.next'], plain);
    if (stopped) return 0;

    const port = await chooseFreePort(wanted.port, wanted.host);
    if (port !== wanted.port) console.log(`Port ${wanted.port} is busy; using ${port}.`);
    const env = buildEnvironment(facts, { ...wanted, port });
    const app = serveApp(['--import', 'tsx', 'lib/server/serve.ts'], {
      ...env,
      NODE_ENV: 'production',
      HEARTCUT_DIST: folder,
    });
    markServed(folder, app.pid);
    const first = await Promise.race([app.ready.then(() => 'ready'), app.exited, stop.then(() => 'stop')]);
    if (first === 'ready') {
      printWelcome(env.NEXTAUTH_URL ?? '', facts);
      const end = await Promise.race([app.exited, stop.then(() => 'stop')]);
      if (end !== 'stop') throw new Error(`The app ended by itself with ${end}. Its output above says why.`);
    } else if (first !== 'stop')
      throw new Error(`The app did not start (${first}). Its output above says why.`);
    console.log('\nStopping ...');
    await app.stop();
    return 0;
  },
  cleanUp: async () => {
    if (held) await releaseServices(home);
  },
});
