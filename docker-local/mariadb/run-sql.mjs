import { spawn } from 'node:child_process';
import { findProgram } from '../commands.mjs';

/**
 * Runs SQL as root through the socket, with MariaDB's own client. Answers its output; throws with its error text.
 * @param {{ socket: string, password: string }} access
 * @param {string} sql
 * @returns {Promise<string>}
 */
export function runSqlAsRoot({ socket, password }, sql) {
  return new Promise((resolve, reject) => {
    const client = findProgram('mariadb') ?? 'mariadb';
    const args = ['--no-defaults', `--socket=${socket}`, '--user=root', '--batch', '--skip-column-names'];
    const child = spawn(client, args, { env: { ...process.env, MYSQL_PWD: password } });
    let [output, errors] = ['', ''];
    child.stdout.on('data', (bytes) => (output += bytes));
    child.stderr.on('data', (bytes) => (errors += bytes));
    child.once('error', reject);
    child.stdin.on('error', () => undefined);
    child.once('close', (code) =>
      code === 0 ? resolve(output) : reject(new Error(`MariaDB refused: ${errors.trim()}`)),
    );
    child.stdin.end(sql);
  });
}
