import { readFile } from 'node:fs/promises';

/** Resident memory of a process in bytes, as Linux counts it. */
export async function residentBytes(pid: number): Promise<number> {
  const status = await readFile(`/proc/${pid}/status`, 'utf8');
  const found = /^VmRSS:\s+(\d+) kB$/m.exec(status);
  if (!found) throw new Error(`Process ${pid} says nothing about its memory.`);
  return Number(found[1]) * 1024;
}

/** Looks every few milliseconds while `work` runs; the highest seen, in bytes. */
export async function peakResidentBytes(pid: number, work: () => Promise<unknown>): Promise<number> {
  let peak = await residentBytes(pid);
  const look = async () => (peak = Math.max(peak, await residentBytes(pid)));
  const timer = setInterval(() => void look().catch(() => undefined), 5);
  try {
    await work();
  } finally {
    clearInterval(timer);
  }
  await look();
  return peak;
}
