import type { Migration } from './run';

export const up: Migration = async (run) => {
  await run(`CREATE TABLE verdicts (
    id UUID PRIMARY KEY,
    fractionId UUID NOT NULL,
    specificationId UUID NULL,
    state ENUM('pass', 'fail', 'inconclusive', 'blind', 'incomplete') NOT NULL,
    criteria JSON NOT NULL,
    coverage JSON NOT NULL,
    engineVersion VARCHAR(40) NOT NULL,
    contentDigest CHAR(64) NOT NULL,
    createdAt DATETIME(3) NOT NULL,
    KEY byFraction (fractionId, createdAt),
    FOREIGN KEY (fractionId) REFERENCES fractions (id)
  )`);
  await run(`CREATE TABLE signatures (
    id UUID PRIMARY KEY,
    code VARCHAR(24) NOT NULL UNIQUE,
    fractionId UUID NOT NULL,
    signerId UUID NOT NULL,
    signerName VARCHAR(160) NOT NULL,
    role VARCHAR(20) NOT NULL,
    meaning VARCHAR(200) NOT NULL,
    comment VARCHAR(1000) NULL,
    manifest LONGTEXT NOT NULL,
    manifestDigest CHAR(64) NOT NULL,
    verdictId UUID NOT NULL,
    signedAt DATETIME(3) NOT NULL,
    supersededAt DATETIME(3) NULL,
    supersededReason VARCHAR(1000) NULL,
    KEY byFraction (fractionId, signedAt),
    FOREIGN KEY (fractionId) REFERENCES fractions (id),
    FOREIGN KEY (signerId) REFERENCES users (id),
    FOREIGN KEY (verdictId) REFERENCES verdicts (id)
  )`);
  // Append-only: the application's account gets no UPDATE or DELETE on this table (see run.ts).
  await run(`CREATE TABLE audit_events (
    sequence BIGINT PRIMARY KEY,
    id UUID NOT NULL UNIQUE,
    at DATETIME(3) NOT NULL,
    type VARCHAR(60) NOT NULL,
    recordType VARCHAR(40) NOT NULL,
    recordId VARCHAR(64) NOT NULL,
    groupId UUID NULL,
    actorKind ENUM('user', 'token', 'system') NOT NULL,
    actorId UUID NULL,
    actorName VARCHAR(160) NOT NULL,
    reason VARCHAR(1000) NULL,
    \`before\` LONGTEXT NULL,
    \`after\` LONGTEXT NULL,
    origin LONGTEXT NOT NULL,
    previousHash CHAR(64) NOT NULL,
    hash CHAR(64) NOT NULL UNIQUE,
    KEY byRecord (recordType, recordId, sequence),
    KEY byActor (actorId, sequence),
    KEY byGroup (groupId, sequence),
    KEY byTime (at)
  )`);
  // The one row that says where the chain ends; locked for the few milliseconds of a commit.
  await run(`CREATE TABLE audit_heads (
    id TINYINT PRIMARY KEY,
    sequence BIGINT NOT NULL,
    hash CHAR(64) NOT NULL
  )`);
  await run(`INSERT INTO audit_heads (id, sequence, hash) VALUES (1, 0, REPEAT('0', 64))`);
  await run(`CREATE TABLE outbox_messages (
    id UUID PRIMARY KEY,
    kind VARCHAR(60) NOT NULL,
    recipient VARCHAR(254) NOT NULL,
    subject VARCHAR(300) NOT NULL,
    body TEXT NOT NULL,
    attempts INT NOT NULL DEFAULT 0,
    nextAttemptAt DATETIME(3) NOT NULL,
    sentAt DATETIME(3) NULL,
    lastError VARCHAR(500) NULL,
    createdAt DATETIME(3) NOT NULL,
    KEY due (sentAt, nextAttemptAt)
  )`);
  await run(`CREATE TABLE idempotency_keys (
    owner VARCHAR(60) NOT NULL,
    idempotencyKey VARCHAR(200) NOT NULL,
    requestDigest CHAR(64) NOT NULL,
    status INT NULL,
    response LONGTEXT NULL,
    createdAt DATETIME(3) NOT NULL,
    PRIMARY KEY (owner, idempotencyKey),
    KEY byAge (createdAt)
  )`);
  await run(`CREATE TABLE shares (
    id UUID PRIMARY KEY,
    fractionId UUID NOT NULL,
    tokenHash CHAR(64) NOT NULL UNIQUE,
    recipient VARCHAR(254) NULL,
    expiresAt DATETIME(3) NOT NULL,
    revokedAt DATETIME(3) NULL,
    madeById UUID NOT NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    KEY byFraction (fractionId),
    FOREIGN KEY (fractionId) REFERENCES fractions (id)
  )`);
};
