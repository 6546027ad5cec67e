import type { Transaction } from 'sequelize';
import { loadCompoundFacts } from '@/lib/acceptance/compound-facts';
import { type Run, RunImpurity } from '@/lib/database/records';
import type { PlateCompound } from './before-after';

/** Target and known impurities of runs, with what decides whether a visualiser shows them, by the run's id. */
export async function loadPlateCompounds(
  runs: Run[],
  transaction?: Transaction,
): Promise<Map<string, PlateCompound[]>> {
  const impurities = await RunImpurity.findAll({
    where: { runId: runs.map((run) => run.id) },
    order: [['id', 'ASC']],
    transaction,
  });
  const ids = [...runs.map((run) => run.targetCompoundId), ...impurities.map((one) => one.compoundId)];
  const { byId } = await loadCompoundFacts([...new Set(ids)], transaction);
  return new Map(
    runs.map((run) => {
      const ofRun = impurities.filter((one) => one.runId === run.id).map((one) => one.compoundId);
      const compounds = [...new Set([run.targetCompoundId, ...ofRun])].flatMap((id): PlateCompound[] => {
        const facts = byId.get(id);
        if (!facts) return [];
        const { name, plateFeatures: features, normalBoilingPointC } = facts;
        return [{ id, name, isTarget: id === run.targetCompoundId, features, normalBoilingPointC }];
      });
      return [run.id, compounds];
    }),
  );
}
