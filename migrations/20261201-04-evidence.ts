import type { Migration } from './run';

export const up: Migration = async (run) => {
  await run(`CREATE TABLE instruments (
    id UUID PRIMARY KEY,
    groupId UUID NOT NULL,
    name VARCHAR(160) NOT NULL,
    kind VARCHAR(60) NOT NULL,
    serialNumber VARCHAR(120) NULL,
    place VARCHAR(160) NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    UNIQUE KEY oneName (groupId, name),
    FOREIGN KEY (groupId) REFERENCES \`groups\` (id)
  )`);
  await run(`CREATE TABLE access_tokens (
    id UUID PRIMARY KEY,
    instrumentId UUID NOT NULL,
    name VARCHAR(120) NOT NULL,
    tokenHash CHAR(64) NOT NULL UNIQUE,
    hint VARCHAR(16) NOT NULL,
    scopes JSON NOT NULL,
    expiresAt DATETIME(3) NOT NULL,
    revokedAt DATETIME(3) NULL,
    lastSeenAt DATETIME(3) NULL,
    madeById UUID NOT NULL,
    createdAt DATETIME(3) NOT NULL,
    FOREIGN KEY (instrumentId) REFERENCES instruments (id)
  )`);
  // Facts about original bytes. The bytes are in the object store under a key made from the digest.
  await run(`CREATE TABLE evidence_files (
    id UUID PRIMARY KEY,
    groupId UUID NOT NULL,
    runId UUID NULL,
    fractionId UUID NULL,
    kind ENUM('plate-photo', 'gc-trace', 'document') NOT NULL,
    sha256 CHAR(64) NOT NULL,
    sizeBytes BIGINT NOT NULL,
    mediaType VARCHAR(120) NOT NULL,
    fileName VARCHAR(255) NOT NULL,
    widthPx INT NULL,
    heightPx INT NULL,
    takenAt DATETIME(3) NULL,
    sentByKind ENUM('user', 'token') NOT NULL,
    sentById UUID NOT NULL,
    sentByName VARCHAR(160) NOT NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    UNIQUE KEY onceAFraction (fractionId, sha256),
    KEY byRun (runId),
    KEY byGroupDigest (groupId, sha256),
    FOREIGN KEY (groupId) REFERENCES \`groups\` (id),
    FOREIGN KEY (runId) REFERENCES runs (id),
    FOREIGN KEY (fractionId) REFERENCES fractions (id)
  )`);
  await run(`CREATE TABLE tray_items (
    id UUID PRIMARY KEY,
    groupId UUID NOT NULL,
    evidenceId UUID NOT NULL UNIQUE,
    instrumentId UUID NULL,
    askedFor VARCHAR(60) NULL,
    reason VARCHAR(300) NOT NULL,
    filedAt DATETIME(3) NULL,
    filedById UUID NULL,
    fractionId UUID NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    KEY waiting (groupId, filedAt, createdAt),
    FOREIGN KEY (evidenceId) REFERENCES evidence_files (id)
  )`);
  await run(`CREATE TABLE plates (
    id UUID PRIMARY KEY,
    groupId UUID NOT NULL,
    runId UUID NOT NULL,
    stationaryPhase VARCHAR(160) NOT NULL,
    eluent VARCHAR(200) NOT NULL,
    widthMm DOUBLE NULL,
    heightMm DOUBLE NULL,
    note VARCHAR(1000) NULL,
    markedById UUID NOT NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    KEY byRun (runId),
    FOREIGN KEY (runId) REFERENCES runs (id)
  )`);
  // One plate may be photographed under several visualisers; each photo has its own marks.
  await run(`CREATE TABLE plate_photos (
    id UUID PRIMARY KEY,
    plateId UUID NOT NULL,
    evidenceId UUID NOT NULL,
    visualiser VARCHAR(60) NOT NULL,
    units ENUM('px', 'mm') NOT NULL,
    corners JSON NULL,
    baseline JSON NOT NULL,
    front JSON NOT NULL,
    flags JSON NOT NULL,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    KEY byPlate (plateId),
    FOREIGN KEY (plateId) REFERENCES plates (id),
    FOREIGN KEY (evidenceId) REFERENCES evidence_files (id)
  )`);
  await run(`CREATE TABLE plate_lanes (
    id UUID PRIMARY KEY,
    plateId UUID NOT NULL,
    position INT NOT NULL,
    label VARCHAR(80) NOT NULL,
    subjectKind ENUM('fraction', 'crude', 'reference', 'co-spot', 'blank') NOT NULL,
    fractionId UUID NULL,
    compoundId UUID NULL,
    KEY byPlate (plateId, position),
    KEY byFraction (fractionId),
    FOREIGN KEY (plateId) REFERENCES plates (id),
    FOREIGN KEY (fractionId) REFERENCES fractions (id),
    FOREIGN KEY (compoundId) REFERENCES compounds (id)
  )`);
  await run(`CREATE TABLE plate_spots (
    id UUID PRIMARY KEY,
    laneId UUID NOT NULL,
    photoId UUID NOT NULL,
    position INT NOT NULL,
    x DOUBLE NOT NULL,
    y DOUBLE NOT NULL,
    rf DOUBLE NOT NULL,
    rfUncertainty DOUBLE NOT NULL,
    flags JSON NOT NULL,
    KEY byLane (laneId, position),
    FOREIGN KEY (laneId) REFERENCES plate_lanes (id),
    FOREIGN KEY (photoId) REFERENCES plate_photos (id)
  )`);
  await run(`CREATE TABLE traces (
    id UUID PRIMARY KEY,
    groupId UUID NOT NULL,
    runId UUID NOT NULL,
    fractionId UUID NULL,
    evidenceId UUID NOT NULL,
    subject ENUM('fraction', 'crude', 'blank', 'reference') NOT NULL,
    detector VARCHAR(20) NOT NULL,
    readOptions JSON NOT NULL,
    detected JSON NOT NULL,
    pointCount INT NOT NULL,
    startMin DOUBLE NOT NULL,
    durationMin DOUBLE NOT NULL,
    inForceIntegrationId UUID NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    UNIQUE KEY oneReading (evidenceId, fractionId, subject),
    KEY byFraction (fractionId),
    KEY byRun (runId),
    FOREIGN KEY (runId) REFERENCES runs (id),
    FOREIGN KEY (fractionId) REFERENCES fractions (id),
    FOREIGN KEY (evidenceId) REFERENCES evidence_files (id)
  )`);
  await run(`CREATE TABLE integrations (
    id UUID PRIMARY KEY,
    traceId UUID NOT NULL,
    number INT NOT NULL,
    methodVersion VARCHAR(40) NOT NULL,
    parameters JSON NOT NULL,
    reason VARCHAR(1000) NULL,
    authorId UUID NULL,
    authorName VARCHAR(160) NOT NULL,
    noise DOUBLE NOT NULL,
    baseline JSON NOT NULL,
    flags JSON NOT NULL,
    createdAt DATETIME(3) NOT NULL,
    UNIQUE KEY oneNumber (traceId, number),
    FOREIGN KEY (traceId) REFERENCES traces (id)
  )`);
  await run(`CREATE TABLE peaks (
    id UUID PRIMARY KEY,
    integrationId UUID NOT NULL,
    number INT NOT NULL,
    retentionTimeMin DOUBLE NOT NULL,
    startMin DOUBLE NOT NULL,
    endMin DOUBLE NOT NULL,
    area DOUBLE NOT NULL,
    areaPercent DOUBLE NOT NULL,
    height DOUBLE NOT NULL,
    widthHalfMin DOUBLE NULL,
    tailing DOUBLE NULL,
    plates DOUBLE NULL,
    resolution DOUBLE NULL,
    signalToNoise DOUBLE NULL,
    flags JSON NOT NULL,
    compoundId UUID NULL,
    UNIQUE KEY oneNumber (integrationId, number),
    FOREIGN KEY (integrationId) REFERENCES integrations (id),
    FOREIGN KEY (compoundId) REFERENCES compounds (id)
  )`);
  await run(`CREATE TABLE refractive_readings (
    id UUID PRIMARY KEY,
    fractionId UUID NOT NULL,
    readings JSON NOT NULL,
    temperatureC DOUBLE NOT NULL,
    wavelengthNm DOUBLE NOT NULL,
    waterReading DOUBLE NULL,
    waterTemperatureC DOUBLE NULL,
    instrument VARCHAR(160) NULL,
    result JSON NOT NULL,
    state ENUM('pass', 'fail', 'inconclusive') NOT NULL,
    methodVersion VARCHAR(40) NOT NULL,
    readById UUID NULL,
    readByName VARCHAR(160) NOT NULL,
    createdAt DATETIME(3) NOT NULL,
    KEY byFraction (fractionId, createdAt),
    FOREIGN KEY (fractionId) REFERENCES fractions (id)
  )`);
};
