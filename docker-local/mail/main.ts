import { announceReady, listenFrom, stopOnSignal } from '../service-process.mjs';
import { createInboxServer } from './inbox-page';
import { Mailbox } from './mailbox';
import { createSmtpServer } from './smtp';

/** Starts the mail service from its environment; see `services.mjs`, which sets these variables. */
const { MAIL_FOLDER } = process.env;
if (!MAIL_FOLDER) throw new Error('Set MAIL_FOLDER.');

// Evidence and mail are nobody else's business on a shared machine.
process.umask(0o077);
const mailbox = new Mailbox(MAIL_FOLDER);
const smtp = createSmtpServer(mailbox);
smtp.on('error', (error) => console.error(error));
const inbox = createInboxServer(mailbox);
const port = await listenFrom(smtp.server, Number(process.env.MAIL_SMTP_PORT ?? 0));
const inboxPort = await listenFrom(inbox, Number(process.env.MAIL_INBOX_PORT ?? 0));
announceReady({ port, inboxPort });
stopOnSignal(async () => {
  inbox.closeAllConnections();
  inbox.close();
  await new Promise<void>((resolve) => smtp.close(() => resolve()));
});
