import type { Actor } from '@/lib/auth/actor';
import type { EvidenceFile } from '@/lib/database/records';
import { Problem } from '@/lib/errors';
import { log } from '@/lib/log';
import { readTraceAfterStored } from './gc/after-stored';
import type { EvidenceKind } from './kinds';

/**
 * What happens after a file of a kind was stored under a fraction or a run, once its row is committed. It runs after
 * an upload (also a repeated one) and after a file was taken from the tray, so it must do nothing the second time. A
 * Problem that it throws becomes a note in the answer: the file is kept in any case.
 */
export type AfterStored = (actor: Actor, evidence: EvidenceFile) => Promise<void>;

/**
 * The one place where kinds of evidence meet code: a kind whose files are read on arrival names its reader here. Its
 * media types and limits stand in kinds.ts.
 */
const afterStored: Record<EvidenceKind, AfterStored | null> = {
  // Marked by a person on its page.
  'plate-photo': null,
  'gc-trace': readTraceAfterStored,
  // Kept and shown, never interpreted.
  document: null,
};

/** Runs the reader of the file's kind; returns what could not be read, in words, and never throws. */
export async function runAfterStored(actor: Actor, evidence: EvidenceFile): Promise<string[]> {
  const hook = afterStored[evidence.kind];
  if (!hook || (evidence.fractionId === null && evidence.runId === null)) return [];
  try {
    await hook(actor, evidence);
    return [];
  } catch (error) {
    if (error instanceof Problem) return [error.detail];
    log().error({ err: error, evidenceId: evidence.id }, 'a stored file could not be read');
    return ['The file is stored, but reading it failed on our side. Open it later and read it again.'];
  }
}
