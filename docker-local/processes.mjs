import { readFileSync } from 'node:fs';
import { setTimeout as wait } from 'node:timers/promises';

/**
 * A process, told apart from a later one that happens to get the same number.
 * @typedef {{ pid: number, startToken: string }} ProcessIdentity
 */

/**
 * When a process began, in the kernel's ticks; '' where the system does not tell, null when there is none.
 * Source: proc(5), /proc/pid/stat, fields 3 (state) and 22 (starttime).
 * @param {number} pid
 */
function findStartToken(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' ? null : (fields[19] ?? '');
  } catch {
    if (process.platform === 'linux') return null;
  }
  try {
    process.kill(pid, 0);
    return '';
  } catch {
    return null;
  }
}

/**
 * @param {number} pid
 * @returns {ProcessIdentity}
 */
export function identify(pid) {
  return { pid, startToken: findStartToken(pid) ?? '' };
}

/** @param {ProcessIdentity | null | undefined} identity */
export function isAlive(identity) {
  if (!identity?.pid) return false;
  const token = findStartToken(identity.pid);
  return token !== null && token === identity.startToken;
}

/**
 * Asks a process to end, waits, and kills it when it does not. Does nothing when it is gone already.
 * @param {ProcessIdentity | null | undefined} identity
 * @param {number} patienceMs
 */
export async function stopProcess(identity, patienceMs = 20_000) {
  for (const signal of /** @type {const} */ (['SIGTERM', 'SIGKILL'])) {
    if (!identity || !isAlive(identity)) return;
    try {
      process.kill(identity.pid, signal);
    } catch {
      return;
    }
    for (let waitedMs = 0; waitedMs < patienceMs && isAlive(identity); waitedMs += 25) await wait(25);
  }
}
