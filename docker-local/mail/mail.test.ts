import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import nodemailer from 'nodemailer';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { listenFrom } from '../service-process.mjs';
import { createInboxServer } from './inbox-page';
import { Mailbox, type StoredMessage } from './mailbox';
import { createSmtpServer } from './smtp';

const folder = mkdtempSync(join(tmpdir(), 'heartcut-mail-'));
const smtp = createSmtpServer(new Mailbox(folder));
const inbox = createInboxServer(new Mailbox(folder));
let inboxUrl = '';

beforeAll(async () => {
  await listenFrom(smtp.server, 0);
  inboxUrl = `http://127.0.0.1:${await listenFrom(inbox, 0)}`;
});
afterAll(async () => {
  inbox.close();
  await new Promise<void>((resolve) => smtp.close(() => resolve()));
  rmSync(folder, { recursive: true, force: true });
});

const TEXT =
  'Fraction D-2026-0042-F3: n = 1.4726 at 20 °C.\nhttp://127.0.0.1:3000/fractions/1?a=1&b=2\n<script>alert(1)</script>';

it('keeps a sent message as .eml and shows it as JSON and as a page', async () => {
  const { port } = smtp.server.address() as AddressInfo;
  const mailer = nodemailer.createTransport(`smtp://127.0.0.1:${port}`);
  await mailer.sendMail({
    from: 'Heartcut <heartcut@heartcut.example>',
    to: 'Chemist <chemist@heartcut.example>',
    bcc: 'pi@heartcut.example',
    subject:
      'Signed off: größte Fraktion — “heart cut” with a subject long enough to be folded into several words',
    text: TEXT,
    html: '<p>The same</p>',
  });
  const messages = (await (await fetch(`${inboxUrl}/messages.json`)).json()) as StoredMessage[];
  expect(messages).toHaveLength(1);
  expect(messages[0]).toMatchObject({
    subject:
      'Signed off: größte Fraktion — “heart cut” with a subject long enough to be folded into several words',
    recipients: ['chemist@heartcut.example', 'pi@heartcut.example'],
    text: TEXT,
  });
  expect(readFileSync(join(folder, messages[0]!.emlFile), 'utf8')).toContain(
    'To: Chemist <chemist@heartcut.example>',
  );
  expect(readdirSync(folder)).toHaveLength(2);
  const page = await (await fetch(inboxUrl)).text();
  expect(page).toContain('href="http://127.0.0.1:3000/fractions/1?a=1&amp;b=2"');
  expect(page).not.toContain('<script>');
});
