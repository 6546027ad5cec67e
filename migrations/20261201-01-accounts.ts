import type { Migration } from './run';

export const up: Migration = async (run) => {
  await run(`CREATE TABLE \`groups\` (
    id UUID PRIMARY KEY,
    name VARCHAR(120) NOT NULL UNIQUE,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL
  )`);
  await run(`CREATE TABLE users (
    id UUID PRIMARY KEY,
    email VARCHAR(254) NOT NULL UNIQUE,
    name VARCHAR(120) NOT NULL,
    passwordHash VARCHAR(255) NOT NULL,
    mustChangePassword BOOLEAN NOT NULL DEFAULT FALSE,
    isAdmin BOOLEAN NOT NULL DEFAULT FALSE,
    sessionVersion INT NOT NULL DEFAULT 1,
    disabledAt DATETIME(3) NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL
  )`);
  await run(`CREATE TABLE memberships (
    id UUID PRIMARY KEY,
    userId UUID NOT NULL,
    groupId UUID NOT NULL,
    role ENUM('chemist', 'analyst', 'pi') NOT NULL,
    createdAt DATETIME(3) NOT NULL,
    UNIQUE KEY oneRoleOnce (userId, groupId, role),
    KEY byGroup (groupId),
    FOREIGN KEY (userId) REFERENCES users (id),
    FOREIGN KEY (groupId) REFERENCES \`groups\` (id)
  )`);
  // One row an account or address; kept in the database so that every app instance counts together.
  await run(`CREATE TABLE sign_in_throttles (
    subject VARCHAR(300) PRIMARY KEY,
    failures INT NOT NULL,
    lockedUntil DATETIME(3) NULL,
    updatedAt DATETIME(3) NOT NULL
  )`);
  // Sign-ins that were ended before they ran out; a row is forgotten when its session would be over anyway.
  await run(`CREATE TABLE ended_sessions (
    id UUID PRIMARY KEY,
    endedAt DATETIME(3) NOT NULL,
    KEY byTime (endedAt)
  )`);
  await run(`CREATE TABLE password_resets (
    id UUID PRIMARY KEY,
    userId UUID NOT NULL,
    tokenHash CHAR(64) NOT NULL UNIQUE,
    expiresAt DATETIME(3) NOT NULL,
    usedAt DATETIME(3) NULL,
    createdAt DATETIME(3) NOT NULL,
    FOREIGN KEY (userId) REFERENCES users (id)
  )`);
};
