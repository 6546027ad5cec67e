import { QueryTypes } from 'sequelize';
import { verifyPassword } from '@/lib/accounts/password';
import { database } from '@/lib/database/connection';
import { env } from '@/lib/env';
import demoAccounts from '@/seeders/demo-accounts.json';

const demoWords = ['demo', 'local', 'heartcut', 'example', 'secret', 'change-me', 'changeme'];

function looksLikeDemo(secret: string): boolean {
  const low = secret.toLowerCase();
  return demoWords.some((word) => low === word || low.startsWith(`${word}-`)) || new Set(secret).size < 10;
}

/**
 * Refuses to serve in production with secrets that anybody can read in this repository: a weak session
 * secret or store key, or a demo account that still has its published password.
 */
export async function checkBeforeStart(): Promise<void> {
  const { production, authSecret, s3, publicUrl } = env();
  await database().query('SELECT 1', { type: QueryTypes.SELECT });
  if (!production) return;
  if (looksLikeDemo(authSecret))
    throw new Error('NEXTAUTH_SECRET is a demo value. Make one: openssl rand -base64 48');
  if (looksLikeDemo(s3.secretKey))
    throw new Error('S3_SECRET_KEY is a demo value. Set the key of your object store.');
  if (
    !publicUrl.startsWith('https://') &&
    !/^http:\/\/(127\.0\.0\.1|localhost|\[::1\])(:|$)/.test(publicUrl)
  ) {
    throw new Error(
      'NEXTAUTH_URL must start with https:// in production: passwords and signatures travel over it.',
    );
  }
  const rows = await database().query<{ email: string; passwordHash: string }>(
    'SELECT email, passwordHash FROM users WHERE email IN (?) AND disabledAt IS NULL',
    { replacements: [demoAccounts.map((account) => account.email)], type: QueryTypes.SELECT },
  );
  for (const row of rows) {
    const published = demoAccounts.find((account) => account.email === row.email)?.password ?? '';
    if (await verifyPassword(published, row.passwordHash)) {
      throw new Error(
        `The demo account ${row.email} still has its published password. Disable it or change the password first.`,
      );
    }
  }
}
