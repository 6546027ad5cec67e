import { BUCKET } from './services.mjs';
import { APP_ACCOUNT, MIGRATE_ACCOUNT } from './mariadb/accounts.mjs';
import { readSecrets } from './secrets.mjs';

/** The variables by which a user points the app at services elsewhere. */
export const SERVICE_VARIABLES = [
  'DATABASE_HOST',
  'DATABASE_PORT',
  'DATABASE_NAME',
  'DATABASE_USER',
  'DATABASE_PASSWORD',
  'DATABASE_MIGRATE_USER',
  'DATABASE_MIGRATE_PASSWORD',
  'S3_ENDPOINT',
  'S3_REGION',
  'S3_BUCKET',
  'S3_ACCESS_KEY',
  'S3_SECRET_KEY',
  'SMTP_URL',
];

/**
 * The environment of the app and its scripts, from what the local services say. A variable that is set already wins,
 * so that a database, store or mail server elsewhere is only a matter of variables.
 * @param {import('./services.mjs').ServiceFacts} facts
 * @param {{ port: number, host?: string, databaseName?: string, base?: Record<string, string | undefined> }} options
 * @returns {Record<string, string | undefined>}
 */
export function buildEnvironment(
  facts,
  { port, host = '127.0.0.1', databaseName = 'heartcut', base = process.env },
) {
  const secrets = readSecrets(facts.home);
  const { mariadb, s3, mail } = facts;
  const shownHost =
    host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host.includes(':') ? `[${host}]` : host;
  const computed = {
    ...(mariadb && {
      DATABASE_HOST: '127.0.0.1',
      DATABASE_PORT: String(mariadb.port),
      DATABASE_NAME: databaseName,
      DATABASE_USER: APP_ACCOUNT,
      DATABASE_PASSWORD: secrets.databasePassword,
      DATABASE_MIGRATE_USER: MIGRATE_ACCOUNT,
      DATABASE_MIGRATE_PASSWORD: secrets.databaseMigratePassword,
    }),
    ...(s3 && {
      S3_ENDPOINT: `http://127.0.0.1:${s3.port}`,
      S3_REGION: 'us-east-1',
      S3_BUCKET: BUCKET,
      S3_ACCESS_KEY: secrets.storeAccessKey,
      S3_SECRET_KEY: secrets.storeSecretKey,
    }),
    ...(mail && { SMTP_URL: `smtp://127.0.0.1:${mail.port}` }),
    MAIL_FROM: 'Heartcut <heartcut@heartcut.example>',
    NEXTAUTH_URL: `http://${shownHost}:${port}`,
    NEXTAUTH_SECRET: secrets.authSecret,
    HEARTCUT_DEMO: '1',
    NEXT_TELEMETRY_DISABLED: '1',
    AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
  };
  const set = Object.fromEntries(
    Object.entries(base).filter(([, value]) => value !== undefined && value !== ''),
  );
  // These four are decided by the scripts: the port may have been taken, and the services live in this home.
  return { ...computed, ...set, HEARTCUT_HOME: facts.home, PORT: String(port), HOST: host };
}
