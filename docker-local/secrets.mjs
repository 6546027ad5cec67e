import { randomBytes } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { findJson, writeJson } from './json-file.mjs';

/**
 * @typedef {{ databaseRootPassword: string, databasePassword: string, databaseMigratePassword: string,
 *   storeAccessKey: string, storeSecretKey: string, authSecret: string }} Secrets
 */

/**
 * The generated passwords and keys of one home folder, made at the first call. The file is readable by its owner only.
 * @param {string} home
 * @returns {Secrets}
 */
export function readSecrets(home) {
  const path = join(home, 'secrets.json');
  mkdirSync(home, { recursive: true });
  const found = findJson(path);
  const make = () => randomBytes(32).toString('base64url');
  const secrets = {
    databaseRootPassword: make(),
    databasePassword: make(),
    databaseMigratePassword: make(),
    storeAccessKey: `heartcut-${randomBytes(6).toString('hex')}`,
    storeSecretKey: make(),
    authSecret: make(),
    ...found,
  };
  if (!found || Object.keys(found).length !== Object.keys(secrets).length) writeJson(path, secrets, 0o600);
  return secrets;
}
