import { createServer, type Server } from 'node:http';
import type { Mailbox, StoredMessage } from './mailbox';

const ESCAPES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };
const escape = (text: string) => text.replace(/[&<>"]/g, (character) => ESCAPES[character]!);

const STYLE = `body{font:16px/1.5 system-ui,sans-serif;max-width:44rem;margin:2rem auto;padding:0 1rem;color-scheme:light dark}
article{border-top:1px solid;padding:1rem 0}h2{margin:0;font-size:1.1rem}pre{white-space:pre-wrap;font:inherit}`;

/** Escaped text with its http(s) addresses made into links, so that a reset link can be followed. */
function presentText(text: string): string {
  return escape(text).replace(/https?:\/\/[^\s<]+/g, (address) => `<a href="${address}">${address}</a>`);
}

function presentMessage(message: StoredMessage): string {
  return `<article><h2>${escape(message.subject) || '(no subject)'}</h2>
<p>To ${escape(message.recipients.join(', '))} · from ${escape(message.from)} · <time>${message.receivedAt}</time></p>
<pre>${presentText(message.text)}</pre></article>`;
}

/** `GET /` for people, `GET /messages.json` for programs. Other host names are refused: pages elsewhere must not read it. */
export function createInboxServer(mailbox: Mailbox): Server {
  return createServer((request, response) => {
    const path = (request.url ?? '/').split('?')[0];
    const send = (status: number, type: string, body: string) => {
      response.writeHead(status, {
        'Content-Type': `${type}; charset=utf-8`,
        'Content-Security-Policy': "default-src 'none'; style-src 'unsafe-inline'",
        'X-Content-Type-Options': 'nosniff',
        'Referrer-Policy': 'no-referrer',
      });
      response.end(body);
    };
    if (!/^(127\.0\.0\.1|localhost)(:\d+)?$/.test(request.headers.host ?? ''))
      return send(403, 'text/plain', 'Use 127.0.0.1.');
    if (request.method !== 'GET') return send(405, 'text/plain', 'Only GET.');
    if (path === '/messages.json') return send(200, 'application/json', JSON.stringify(mailbox.list()));
    if (path !== '/') return send(404, 'text/plain', 'The inbox is at /.');
    const messages =
      mailbox.list().map(presentMessage).join('') || '<p>No mail yet. It appears here when you reload.</p>';
    return send(
      200,
      'text/html',
      `<!doctype html><html lang="en"><meta name="viewport" content="width=device-width"><title>Local mail</title><style>${STYLE}</style><main><h1>Local mail</h1>${messages}</main></html>`,
    );
  });
}
