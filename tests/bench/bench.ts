import mariadb, { type Connection, type Pool } from 'mariadb';
import { closeDatabase } from '@/lib/database/connection';
import { env } from '@/lib/env';
import { type AppProcess, startApp } from './app-process';
import { buildLaboratory, type Laboratory } from './laboratory';

/** What rows share, made when the first row asks for it: `--only gc` starts no server. */
export class Bench {
  private readonly closing: (() => Promise<unknown>)[] = [closeDatabase];
  private appStarted?: Promise<AppProcess>;
  private laboratoryBuilt?: Promise<Laboratory>;
  private connected?: Promise<Connection>;

  /** The app from its build in a process of its own, the same for all rows. */
  app(): Promise<AppProcess> {
    this.appStarted ??= startApp().then((app) => {
      this.closing.push(app.stop);
      return app;
    });
    return this.appStarted;
  }

  /** One invented group with one person of all roles, a run and a fraction. */
  laboratory(): Promise<Laboratory> {
    this.laboratoryBuilt ??= buildLaboratory();
    return this.laboratoryBuilt;
  }

  /** A bare connection of the connector, with the app's own account and none of the app's code around it. */
  database(): Promise<Connection> {
    this.connected ??= mariadb.createConnection(bareOptions()).then((connection) => {
      this.closing.push(() => connection.end());
      return connection;
    });
    return this.connected;
  }

  /** Several bare connections. */
  pool(connectionLimit: number): Pool {
    const pool = mariadb.createPool({ ...bareOptions(), connectionLimit });
    this.closing.push(() => pool.end());
    return pool;
  }

  /** Ends what was started, the last one first; a second call finds nothing to do. */
  async close(): Promise<void> {
    for (let close = this.closing.pop(); close; close = this.closing.pop()) await close();
  }
}

function bareOptions() {
  const { host, port, name, user, password } = env().database;
  return { host, port, user, password, database: name, timezone: 'Z', collation: 'UTF8MB4_UNICODE_CI' };
}
