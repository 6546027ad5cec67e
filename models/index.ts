import type { Sequelize } from 'sequelize';
import { Group, initGroup } from './group';
import { User, initUser } from './user';
import { Membership, initMembership } from './membership';
import { SignInThrottle, initSignInThrottle } from './sign-in-throttle';
import { PasswordReset, initPasswordReset } from './password-reset';
import { Compound, initCompound } from './compound';
import { CompoundSynonym, initCompoundSynonym } from './compound-synonym';
import { LiteratureValue, initLiteratureValue } from './literature-value';
import { Specification, initSpecification } from './specification';
import { CodeCounter, initCodeCounter } from './code-counter';
import { Run, initRun } from './run';
import { RunImpurity, initRunImpurity } from './run-impurity';
import { LogReading, initLogReading } from './log-reading';
import { Fraction, initFraction } from './fraction';
import { FractionTransition, initFractionTransition } from './fraction-transition';
import { Instrument, initInstrument } from './instrument';
import { AccessToken, initAccessToken } from './access-token';
import { EvidenceFile, initEvidenceFile } from './evidence-file';
import { TrayItem, initTrayItem } from './tray-item';
import { Plate, initPlate } from './plate';
import { PlatePhoto, initPlatePhoto } from './plate-photo';
import { PlateLane, initPlateLane } from './plate-lane';
import { PlateSpot, initPlateSpot } from './plate-spot';
import { Trace, initTrace } from './trace';
import { Integration, initIntegration } from './integration';
import { Peak, initPeak } from './peak';
import { RefractiveReading, initRefractiveReading } from './refractive-reading';
import { Verdict, initVerdict } from './verdict';
import { Signature, initSignature } from './signature';
import { OutboxMessage, initOutboxMessage } from './outbox-message';
import { Share, initShare } from './share';
const initialise = [
  initGroup,
  initUser,
  initMembership,
  initSignInThrottle,
  initPasswordReset,
  initCompound,
  initCompoundSynonym,
  initLiteratureValue,
  initSpecification,
  initCodeCounter,
  initRun,
  initRunImpurity,
  initLogReading,
  initFraction,
  initFractionTransition,
  initInstrument,
  initAccessToken,
  initEvidenceFile,
  initTrayItem,
  initPlate,
  initPlatePhoto,
  initPlateLane,
  initPlateSpot,
  initTrace,
  initIntegration,
  initPeak,
  initRefractiveReading,
  initVerdict,
  initSignature,
  initOutboxMessage,
  initShare,
];

let tied: Sequelize | undefined;

/** Ties every model to a connection and to each other; a second call with the same one does nothing. */
export function connectModels(sequelize: Sequelize): void {
  if (tied === sequelize) return;
  tied = sequelize;
  for (const init of initialise) init(sequelize);
  Compound.hasMany(CompoundSynonym, { foreignKey: 'compoundId', as: 'synonyms' });
  Compound.hasMany(LiteratureValue, { foreignKey: 'compoundId', as: 'literature' });
  Run.belongsTo(Compound, { foreignKey: 'targetCompoundId', as: 'target' });
  Run.belongsTo(User, { foreignKey: 'chemistId', as: 'chemist' });
  Run.belongsTo(Group, { foreignKey: 'groupId', as: 'group' });
  Run.belongsToMany(Compound, {
    through: RunImpurity,
    foreignKey: 'runId',
    otherKey: 'compoundId',
    as: 'impurities',
  });
  Run.hasMany(Fraction, { foreignKey: 'runId', as: 'fractions' });
  Fraction.belongsTo(Run, { foreignKey: 'runId', as: 'run' });
  Fraction.belongsTo(Compound, { foreignKey: 'compoundId', as: 'compound' });
  Fraction.belongsTo(User, { foreignKey: 'collectedById', as: 'collectedBy' });
  Plate.hasMany(PlatePhoto, { foreignKey: 'plateId', as: 'photos' });
  Plate.hasMany(PlateLane, { foreignKey: 'plateId', as: 'lanes' });
  PlateLane.hasMany(PlateSpot, { foreignKey: 'laneId', as: 'spots' });
  Trace.hasMany(Integration, { foreignKey: 'traceId', as: 'integrations' });
  Integration.hasMany(Peak, { foreignKey: 'integrationId', as: 'peaks' });
  Membership.belongsTo(Group, { foreignKey: 'groupId', as: 'group' });
  User.hasMany(Membership, { foreignKey: 'userId', as: 'memberships' });
  AccessToken.belongsTo(Instrument, { foreignKey: 'instrumentId', as: 'instrument' });
  TrayItem.belongsTo(EvidenceFile, { foreignKey: 'evidenceId', as: 'evidence' });
}

export {
  Group,
  User,
  Membership,
  SignInThrottle,
  PasswordReset,
  Compound,
  CompoundSynonym,
  LiteratureValue,
  Specification,
  CodeCounter,
  Run,
  RunImpurity,
  LogReading,
  Fraction,
  FractionTransition,
  Instrument,
  AccessToken,
  EvidenceFile,
  TrayItem,
  Plate,
  PlatePhoto,
  PlateLane,
  PlateSpot,
  Trace,
  Integration,
  Peak,
  RefractiveReading,
  Verdict,
  Signature,
  OutboxMessage,
  Share,
};
