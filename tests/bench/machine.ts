import { cpus, loadavg, totalmem } from 'node:os';
import type { Connection } from 'mariadb';

/** What the figures depend on, for a reader who compares two runs. */
export async function describeMachine(database: Connection): Promise<string> {
  const [facts] = await database.query<Record<string, unknown>[]>(
    `SELECT VERSION() AS version, @@innodb_flush_log_at_trx_commit AS flush, @@sync_binlog AS binlog,
       @@innodb_buffer_pool_size DIV 1048576 AS poolMb`,
  );
  const cores = cpus();
  return [
    `${cores.length} cores (${cores[0]?.model.trim() || 'unnamed'}), ${(totalmem() / 1e9).toFixed(1)} GB`,
    `load ${loadavg()[0]!.toFixed(1)} at the start`,
    `Node ${process.version}`,
    `MariaDB ${facts?.version}, flush at commit ${facts?.flush}, buffer pool ${facts?.poolMb} MB`,
  ].join('; ');
}
