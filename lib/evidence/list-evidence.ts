import type { Actor } from '@/lib/auth/actor';
import { visibleGroupIds } from '@/lib/auth/actor';
import { EvidenceFile } from '@/lib/database/records';
import type { EvidenceKind } from './kinds';
import { presentEvidence } from './present';
import { placesOf } from './require-evidence';
import type { EvidenceView } from './schema';

type Where = { fractionId?: string; runId?: string; kind?: EvidenceKind };

async function list(actor: Actor, where: Where): Promise<EvidenceView[]> {
  const files = await EvidenceFile.findAll({
    where: { ...where, groupId: visibleGroupIds(actor) },
    order: [
      ['createdAt', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: 500,
  });
  const places = await placesOf(files);
  return files.map((file) => presentEvidence(file, places.get(file.id)!));
}

/** The files of a fraction, the newest first. */
export function listEvidenceOfFraction(actor: Actor, fractionId: string): Promise<EvidenceView[]> {
  return list(actor, { fractionId });
}

/** The files of a run and of its fractions, the newest first; of one kind if it is given. */
export function listEvidenceOfRun(actor: Actor, runId: string, kind?: EvidenceKind): Promise<EvidenceView[]> {
  return list(actor, { runId, ...(kind ? { kind } : {}) });
}
