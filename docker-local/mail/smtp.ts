import { buffer } from 'node:stream/consumers';
import { SMTPServer } from 'smtp-server';
import type { Mailbox } from './mailbox';

const MAX_MESSAGE_BYTES = 25 * 1024 * 1024;

/** An SMTP server that delivers to nobody: whatever arrives is kept in the mailbox. */
export function createSmtpServer(mailbox: Mailbox): SMTPServer {
  return new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    size: MAX_MESSAGE_BYTES,
    logger: false,
    onData(stream, session, done) {
      buffer(stream)
        .then(async (raw) => {
          if (stream.sizeExceeded)
            throw Object.assign(new Error('The message is too large.'), { responseCode: 552 });
          await mailbox.keep(
            raw,
            session.envelope.rcptTo.map((recipient) => recipient.address),
          );
          done();
        })
        .catch((error: Error) => done(error));
    },
  });
}
