import type { Migration } from './run';

export const up: Migration = async (run) => {
  // Next number for a scope such as 'run:2026'. The row is locked by the transaction that takes a
  // number, so a rolled-back run gives its number back and codes have no gaps.
  await run(`CREATE TABLE code_counters (
    scope VARCHAR(60) PRIMARY KEY,
    nextNumber INT NOT NULL
  )`);
  await run(`CREATE TABLE runs (
    id UUID PRIMARY KEY,
    code VARCHAR(20) NOT NULL UNIQUE,
    groupId UUID NOT NULL,
    chemistId UUID NOT NULL,
    targetCompoundId UUID NOT NULL,
    technique VARCHAR(40) NOT NULL,
    chargeMassG DOUBLE NOT NULL,
    chargeSource VARCHAR(300) NOT NULL,
    chargeLot VARCHAR(120) NULL,
    columnStages DOUBLE NULL,
    bath VARCHAR(120) NULL,
    bathTemperatureC DOUBLE NULL,
    plannedPressureMbar DOUBLE NULL,
    safetyChecks JSON NOT NULL,
    residueMassG DOUBLE NULL,
    note TEXT NULL,
    startedAt DATETIME(3) NOT NULL,
    endedAt DATETIME(3) NULL,
    nextFractionNumber INT NOT NULL DEFAULT 1,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    KEY byGroupTime (groupId, startedAt, id),
    KEY byTarget (targetCompoundId),
    FOREIGN KEY (groupId) REFERENCES \`groups\` (id),
    FOREIGN KEY (chemistId) REFERENCES users (id),
    FOREIGN KEY (targetCompoundId) REFERENCES compounds (id)
  )`);
  await run(`CREATE TABLE run_impurities (
    id UUID PRIMARY KEY,
    runId UUID NOT NULL,
    compoundId UUID NOT NULL,
    UNIQUE KEY onceARun (runId, compoundId),
    FOREIGN KEY (runId) REFERENCES runs (id),
    FOREIGN KEY (compoundId) REFERENCES compounds (id)
  )`);
  await run(`CREATE TABLE log_readings (
    id UUID PRIMARY KEY,
    runId UUID NOT NULL,
    at DATETIME(3) NOT NULL,
    headTemperatureC DOUBLE NULL,
    bathTemperatureC DOUBLE NULL,
    pressureMbar DOUBLE NULL,
    volumeMl DOUBLE NULL,
    note VARCHAR(500) NULL,
    sentByKind ENUM('user', 'token') NOT NULL,
    sentById UUID NOT NULL,
    createdAt DATETIME(3) NOT NULL,
    KEY byRunTime (runId, at, id),
    FOREIGN KEY (runId) REFERENCES runs (id)
  )`);
  await run(`CREATE TABLE fractions (
    id UUID PRIMARY KEY,
    code VARCHAR(30) NOT NULL UNIQUE,
    runId UUID NOT NULL,
    groupId UUID NOT NULL,
    compoundId UUID NOT NULL,
    number INT NOT NULL,
    -- The code with its last number filled up, so that F10 comes after F9.
    codeOrder VARCHAR(40) AS (CONCAT(LEFT(code, CHAR_LENGTH(code) - CHAR_LENGTH(number)), LPAD(number, 6, '0'))) PERSISTENT,
    cut ENUM('fore-run', 'heart', 'tail', 'residue', 'trap') NOT NULL,
    collectedById UUID NOT NULL,
    collectedAt DATETIME(3) NOT NULL,
    headTemperatureFromC DOUBLE NULL,
    headTemperatureToC DOUBLE NULL,
    pressureMbar DOUBLE NULL,
    tareMassG DOUBLE NULL,
    grossMassG DOUBLE NULL,
    netMassG DOUBLE AS (ROUND(grossMassG - tareMassG, 6)) PERSISTENT,
    appearance VARCHAR(300) NULL,
    storagePlace VARCHAR(200) NULL,
    status ENUM('open', 'submitted', 'returned', 'signed off', 'reopened') NOT NULL DEFAULT 'open',
    specificationId UUID NULL,
    verdictId UUID NULL,
    verdictState ENUM('pass', 'fail', 'inconclusive', 'blind', 'incomplete') NOT NULL DEFAULT 'incomplete',
    purityPercent DOUBLE NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    UNIQUE KEY oneNumberARun (runId, number),
    KEY byGroupTime (groupId, collectedAt, id),
    KEY byCompoundTime (groupId, compoundId, collectedAt, id),
    KEY byPurity (groupId, purityPercent, id),
    KEY byStatus (groupId, status, collectedAt, id),
    KEY byVerdict (groupId, verdictState, collectedAt, id),
    KEY byCode (groupId, codeOrder, id),
    FOREIGN KEY (runId) REFERENCES runs (id),
    FOREIGN KEY (compoundId) REFERENCES compounds (id),
    FOREIGN KEY (collectedById) REFERENCES users (id),
    FOREIGN KEY (specificationId) REFERENCES specifications (id)
  )`);
  // The fraction's life as records with who, when and why; `status` is only the latest of them.
  await run(`CREATE TABLE fraction_transitions (
    id UUID PRIMARY KEY,
    fractionId UUID NOT NULL,
    action ENUM('submit', 'return', 'resume', 'sign off', 'reopen', 'supersede') NOT NULL,
    fromStatus VARCHAR(20) NOT NULL,
    toStatus VARCHAR(20) NOT NULL,
    reason VARCHAR(1000) NULL,
    actorId UUID NULL,
    actorName VARCHAR(160) NOT NULL,
    at DATETIME(3) NOT NULL,
    KEY byFraction (fractionId, at),
    FOREIGN KEY (fractionId) REFERENCES fractions (id)
  )`);
};
