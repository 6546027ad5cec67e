import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { EvidenceFile, Fraction, Run } from '@/lib/database/records';
import { notFound } from '@/lib/errors';

/** Where a file is shown to belong: the codes of its fraction and run. */
export type EvidencePlaces = { fraction: string | null; run: string | null };
export type PlacedEvidence = { evidence: EvidenceFile; places: EvidencePlaces };

/** The codes of the fractions and runs of files, by the file's id. */
export async function placesOf(files: EvidenceFile[]): Promise<Map<string, EvidencePlaces>> {
  const idsOf = (key: 'fractionId' | 'runId') => [
    ...new Set(files.map((file) => file[key]).filter((id) => id !== null)),
  ];
  const [fractionIds, runIds] = [idsOf('fractionId'), idsOf('runId')];
  const [fractions, runs] = await Promise.all([
    fractionIds.length ? Fraction.findAll({ where: { id: fractionIds }, attributes: ['id', 'code'] }) : [],
    runIds.length ? Run.findAll({ where: { id: runIds }, attributes: ['id', 'code'] }) : [],
  ]);
  const codes = new Map([...fractions, ...runs].map((record) => [record.id, record.code]));
  return new Map(
    files.map((file) => [
      file.id,
      { fraction: codes.get(file.fractionId ?? '') ?? null, run: codes.get(file.runId ?? '') ?? null },
    ]),
  );
}

/** A file that the actor's groups may see; 404 otherwise. */
export async function requireEvidence(actor: Actor, id: string): Promise<EvidenceFile> {
  const evidence = await EvidenceFile.findOne({ where: { id, groupId: visibleGroupIds(actor) } });
  if (!evidence) throw notFound('evidence file with this id');
  return evidence;
}

export async function requirePlacedEvidence(actor: Actor, id: string): Promise<PlacedEvidence> {
  const evidence = await requireEvidence(actor, id);
  return { evidence, places: (await placesOf([evidence])).get(evidence.id)! };
}
