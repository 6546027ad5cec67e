import { forgetEndedSessions } from '@/lib/auth/ended-sessions';
import { forgetOldKeys } from '@/lib/http/idempotency';
import { log } from '@/lib/log';
import { deliverDueMessages } from '@/lib/mail/deliver-due-messages';

const everyMs = 1_000;

/**
 * The small clock of the process: sends mail that is due and forgets old idempotency keys. Several app
 * instances may run it together, since each message is claimed by a row lock. Returns how to stop it.
 */
export function startHousekeeping(): () => Promise<void> {
  let round = 0;
  let current: Promise<void> = Promise.resolve();
  let busy = false;
  async function tick(): Promise<void> {
    try {
      await deliverDueMessages();
      if (round++ % 600 === 0) {
        await forgetOldKeys();
        await forgetEndedSessions();
      }
    } catch (error) {
      log().warn({ err: error }, 'housekeeping will try again');
    } finally {
      busy = false;
    }
  }
  const timer = setInterval(() => {
    if (busy) return;
    busy = true;
    current = tick();
  }, everyMs);
  return async () => {
    clearInterval(timer);
    await current;
  };
}
