import { migrateAndSeed } from './database-content.mjs';
import { buildEnvironment } from './environment.mjs';
import { chooseFreePort, readWantedAddress } from './free-port.mjs';
import { installDependencies } from './install-dependencies.mjs';
import { homeFolder } from './places.mjs';
import { runUntilStopped } from './run-until-stopped.mjs';
import { serveApp } from './serve-app.mjs';
import { ensureServices, releaseServices } from './services.mjs';

const home = homeFolder();
let held = false;

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
    const port = await chooseFreePort(wanted.port, wanted.host);
    const env = buildEnvironment(facts, { ...wanted, port });
    await migrateAndSeed(home, env);
    if (stopped) return 0;
    if (facts.mail) console.log(`Mail: http://127.0.0.1:${facts.mail.inboxPort}`);
    const args = ['node_modules/next/dist/bin/next', 'dev', '-p', String(port), '-H', wanted.host];
    const app = serveApp(args, { ...env, NODE_ENV: 'development' });
    const end = await Promise.race([app.exited, stop]);
    await app.stop();
    return typeof end === 'number' ? end : 0;
  },
  cleanUp: async () => {
    if (held) await releaseServices(home);
  },
});
