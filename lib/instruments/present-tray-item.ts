import type { EvidenceFile, TrayItem } from '@/lib/database/records';
import { presentEvidenceAnswer } from '@/lib/evidence/present';
import type { EvidencePlaces } from '@/lib/evidence/require-evidence';
import type { TrayItemView } from './tray-schema';

export function presentTrayItem(
  item: TrayItem,
  evidence: EvidenceFile,
  places: EvidencePlaces,
  instrument: string | null,
): TrayItemView {
  return {
    id: item.id,
    reason: item.reason,
    askedFor: item.askedFor,
    instrument,
    receivedAt: item.createdAt.toISOString(),
    ...presentEvidenceAnswer(evidence, places),
    filedAt: item.filedAt?.toISOString() ?? null,
    version: item.version,
  };
}
