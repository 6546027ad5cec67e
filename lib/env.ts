import { z } from 'zod';

/**
 * The only reader of process.env in the application. Each key is described in .env.example;
 * tests/architecture compares the two.
 */
const schema = z.object({
  NODE_ENV: z.enum(['development', 'production', 'test']).default('development'),
  HEARTCUT_DEMO: z.enum(['0', '1']).default('0'),
  HEARTCUT_HOME: z.string().min(1).default('.local'),
  PORT: z.coerce.number().int().min(0).max(65535).default(3000),
  HOST: z.string().min(1).default('127.0.0.1'),
  TRUSTED_PROXIES: z.coerce.number().int().min(0).max(5).default(0),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  DATABASE_HOST: z.string().min(1).default('127.0.0.1'),
  DATABASE_PORT: z.coerce.number().int().default(3306),
  DATABASE_NAME: z.string().min(1).default('heartcut'),
  DATABASE_USER: z.string().min(1),
  DATABASE_PASSWORD: z.string(),
  DATABASE_MIGRATE_USER: z.string().optional(),
  DATABASE_MIGRATE_PASSWORD: z.string().optional(),
  S3_ENDPOINT: z.url(),
  S3_REGION: z.string().min(1).default('us-east-1'),
  S3_BUCKET: z.string().min(3),
  S3_ACCESS_KEY: z.string().min(1),
  S3_SECRET_KEY: z.string().min(1),
  SMTP_URL: z.string().min(1),
  MAIL_FROM: z.string().min(3).default('Heartcut <heartcut@heartcut.example>'),
  NEXTAUTH_URL: z.url(),
  NEXTAUTH_SECRET: z.string().min(32, 'make one with: openssl rand -base64 48'),
});

export const environmentKeys = Object.keys(schema.shape);

function read() {
  const parsed = schema.safeParse(process.env);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`The environment is not complete. See .env.example.\n${lines.join('\n')}`);
  }
  const e = parsed.data;
  return {
    production: e.HEARTCUT_DEMO === '0' && e.NODE_ENV === 'production',
    demo: e.HEARTCUT_DEMO === '1',
    home: e.HEARTCUT_HOME,
    port: e.PORT,
    host: e.HOST,
    trustedProxies: e.TRUSTED_PROXIES,
    logLevel: e.LOG_LEVEL,
    publicUrl: e.NEXTAUTH_URL.replace(/\/$/, ''),
    authSecret: e.NEXTAUTH_SECRET,
    database: {
      host: e.DATABASE_HOST,
      port: e.DATABASE_PORT,
      name: e.DATABASE_NAME,
      user: e.DATABASE_USER,
      password: e.DATABASE_PASSWORD,
      migrateUser: e.DATABASE_MIGRATE_USER ?? e.DATABASE_USER,
      migratePassword: e.DATABASE_MIGRATE_PASSWORD ?? e.DATABASE_PASSWORD,
    },
    s3: {
      endpoint: e.S3_ENDPOINT,
      region: e.S3_REGION,
      bucket: e.S3_BUCKET,
      accessKey: e.S3_ACCESS_KEY,
      secretKey: e.S3_SECRET_KEY,
    },
    smtpUrl: e.SMTP_URL,
    mailFrom: e.MAIL_FROM,
  };
}

export type Environment = ReturnType<typeof read>;

/** Reads and checks the environment anew: tests change NEXTAUTH_URL once the port is known. */
export function env(): Environment {
  return read();
}
