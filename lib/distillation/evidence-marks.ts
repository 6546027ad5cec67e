import { z } from 'zod';

export const evidenceKinds = ['tlc', 'gc', 'refractiveIndex', 'boilingRange'] as const;
export type EvidenceKind = (typeof evidenceKinds)[number];
export const evidenceMarkStates = ['pass', 'fail', 'inconclusive', 'blind', 'missing'] as const;
export type EvidenceMarkState = (typeof evidenceMarkStates)[number];
export type EvidenceMarks = Record<EvidenceKind, EvidenceMarkState>;

const storedCriteria = z.object({
  results: z.array(z.object({ name: z.string(), state: z.enum(evidenceMarkStates) })),
});

const beginnings: Record<EvidenceKind, string> = {
  tlc: 'TLC',
  gc: 'GC',
  refractiveIndex: 'Refractive index',
  boilingRange: 'Boiling range',
};
/** What outweighs what when several criteria look at one kind of evidence. */
const weight: Record<EvidenceMarkState, number> = { fail: 5, blind: 4, missing: 3, inconclusive: 2, pass: 1 };

/**
 * One mark for each kind of evidence, from the criteria of a verdict as they are stored: the heaviest of
 * its criteria. No criterion of a kind, or no verdict, is `missing`: missing evidence is never a pass.
 */
export function evidenceMarks(criteria: unknown): EvidenceMarks {
  const parsed = storedCriteria.safeParse(criteria);
  const results = parsed.success ? parsed.data.results : [];
  const markOf = (kind: EvidenceKind) =>
    results
      .filter((result) => result.name.startsWith(beginnings[kind]))
      .map((result) => result.state)
      .sort((a, b) => weight[b] - weight[a])[0] ?? 'missing';
  return {
    tlc: markOf('tlc'),
    gc: markOf('gc'),
    refractiveIndex: markOf('refractiveIndex'),
    boilingRange: markOf('boilingRange'),
  };
}
