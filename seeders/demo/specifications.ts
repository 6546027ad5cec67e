import type { Criteria } from '@/lib/acceptance/criteria/registry';
import { writeSpecification } from '@/lib/acceptance/write-specification';
import { Compound, Specification } from '@/lib/database/records';
import type { DemoGroup, Team } from './people';
import { BENZALDEHYDE, CITRAL, CYCLOHEXANONE, ETHYL_ACETATE, LIMONENE, LINALOOL } from './substances';

const GRADE = 'working grade';

const LIMITS: readonly { group: DemoGroup; cas: string; criteria: Criteria }[] = [
  {
    group: 'terpenes',
    cas: LIMONENE,
    criteria: {
      gcAreaPercentMin: 97,
      gcSingleImpurityMaxPercent: 2,
      refractiveIndexTolerance: 0.0015,
      tlcCleanUnder: ['permanganate'],
    },
  },
  {
    group: 'terpenes',
    cas: LINALOOL,
    criteria: {
      gcAreaPercentMin: 97.5,
      gcSingleImpurityMaxPercent: 1.5,
      refractiveIndexTolerance: 0.0015,
      tlcCleanUnder: ['permanganate'],
    },
  },
  {
    group: 'terpenes',
    cas: CITRAL,
    criteria: { gcAreaPercentMin: 96, refractiveIndexTolerance: 0.0015, tlcCleanUnder: ['uv-254'] },
  },
  {
    group: 'terpenes',
    cas: ETHYL_ACETATE,
    criteria: {
      gcAreaPercentMin: 99.5,
      boilingRange: { toleranceC: 1.5, maximumWidthC: 1.5 },
    },
  },
  {
    group: 'terpenes',
    cas: CYCLOHEXANONE,
    criteria: { gcAreaPercentMin: 99, refractiveIndexTolerance: 0.0015 },
  },
  {
    group: 'solvents',
    cas: CYCLOHEXANONE,
    criteria: { gcAreaPercentMin: 99, gcSingleImpurityMaxPercent: 0.8, refractiveIndexTolerance: 0.0015 },
  },
  {
    group: 'solvents',
    cas: BENZALDEHYDE,
    criteria: {
      gcAreaPercentMin: 98.5,
      refractiveIndexTolerance: 0.0015,
      tlcCleanUnder: ['uv-254'],
    },
  },
  {
    group: 'solvents',
    cas: LIMONENE,
    criteria: { gcAreaPercentMin: 96, refractiveIndexTolerance: 0.0015 },
  },
];

/** Writes and approves one specification a compound and group, as their PI. What is there already stays. */
export async function writeSpecifications(teams: Record<DemoGroup, Team>): Promise<void> {
  for (const { group, cas, criteria } of LIMITS) {
    const team = teams[group];
    const compound = await Compound.findOne({ where: { casNumber: cas }, rejectOnEmpty: true });
    const where = { groupId: team.group.id, compoundId: compound.id, grade: GRADE };
    if (await Specification.findOne({ where })) continue;
    await writeSpecification(team.pi.actor, compound.id, {
      grade: GRADE,
      decisionRule: 'guarded',
      criteria,
      note: `Limits invented for the demo laboratory.`,
      group: team.group.id,
      approve: true,
    });
  }
}
