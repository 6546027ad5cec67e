import { installDependencies } from './install-dependencies.mjs';
import { homeFolder } from './places.mjs';
import { runUntilStopped } from './run-until-stopped.mjs';
import { ensureServices, stopServices } from './services.mjs';

const home = homeFolder();

await runUntilStopped({
  async work() {
    if (process.argv[2] === 'down') {
      await stopServices(home);
      console.log('The local services are stopped.');
      return 0;
    }
    await installDependencies();
    const { mariadb, s3, mail } = await ensureServices({ home, keep: true });
    console.log(`The local services run until "npm run services:down"; state in ${home}:`);
    if (mariadb) console.log(`  MariaDB  127.0.0.1:${mariadb.port}  socket ${mariadb.socket}`);
    if (s3) console.log(`  Objects  http://127.0.0.1:${s3.port}`);
    if (mail)
      console.log(`  Mail     smtp://127.0.0.1:${mail.port}  inbox http://127.0.0.1:${mail.inboxPort}`);
    return 0;
  },
  cleanUp: async () => undefined,
});
