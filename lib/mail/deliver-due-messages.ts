import nodemailer from 'nodemailer';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import { env } from '@/lib/env';
import { log } from '@/lib/log';

type Due = { id: string; recipient: string; subject: string; body: string; attempts: number };

const batch = 20;

function transport() {
  return nodemailer.createTransport(env().smtpUrl, {
    connectionTimeout: 5_000,
    greetingTimeout: 5_000,
    socketTimeout: 15_000,
  } as never);
}

/** Seconds until the next try: 5, 10, 20 ... at most one hour. A message is never given up. */
export function backOffSeconds(attempts: number): number {
  return Math.min(3600, 5 * 2 ** Math.min(attempts, 12));
}

async function claim(): Promise<Due[]> {
  return database().transaction(async (transaction) => {
    const due = await database().query<Due>(
      `SELECT id, recipient, subject, body, attempts FROM outbox_messages
       WHERE sentAt IS NULL AND nextAttemptAt <= UTC_TIMESTAMP(3) ORDER BY nextAttemptAt LIMIT ${batch} FOR UPDATE SKIP LOCKED`,
      { type: QueryTypes.SELECT, transaction },
    );
    if (due.length > 0) {
      // A lease: if this process dies while sending, the message is due again after a minute.
      await database().query(
        'UPDATE outbox_messages SET nextAttemptAt = UTC_TIMESTAMP(3) + INTERVAL 60 SECOND WHERE id IN (?)',
        {
          replacements: [due.map((message) => message.id)],
          type: QueryTypes.UPDATE,
          transaction,
        },
      );
    }
    return due;
  });
}

/** Sends the messages that are due, one by one, and notes for each that it went or why not. */
export async function deliverDueMessages(): Promise<number> {
  const due = await claim();
  if (due.length === 0) return 0;
  const mailer = transport();
  let sent = 0;
  for (const message of due) {
    try {
      await mailer.sendMail({
        from: env().mailFrom,
        to: message.recipient,
        subject: message.subject,
        text: message.body,
        messageId: `<${message.id}@heartcut>`,
      });
      await database().query(
        'UPDATE outbox_messages SET sentAt = UTC_TIMESTAMP(3), attempts = attempts + 1, lastError = NULL WHERE id = ?',
        {
          replacements: [message.id],
          type: QueryTypes.UPDATE,
        },
      );
      sent += 1;
    } catch (error) {
      log().warn({ messageId: message.id, err: error }, 'mail was not taken; it will be tried again');
      await database().query(
        'UPDATE outbox_messages SET attempts = attempts + 1, lastError = ?, nextAttemptAt = UTC_TIMESTAMP(3) + INTERVAL ? SECOND WHERE id = ?',
        {
          replacements: [
            String((error as Error).message).slice(0, 500),
            backOffSeconds(message.attempts),
            message.id,
          ],
          type: QueryTypes.UPDATE,
        },
      );
    }
  }
  mailer.close();
  return sent;
}
