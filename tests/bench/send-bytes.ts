import { request } from 'node:http';
import { text } from 'node:stream/consumers';

/** Sends bytes from memory with nothing between them and the socket. Throws unless the answer is 2xx. */
export function sendBytes(
  url: string,
  bytes: Buffer,
  { method, headers = {} }: { method: 'POST' | 'PUT'; headers?: Record<string, string> },
): Promise<string> {
  return new Promise((resolve, reject) => {
    const call = request(url, {
      method,
      agent: false,
      timeout: 60_000,
      headers: { 'content-length': bytes.length, ...headers },
    });
    call.once('error', reject);
    call.once('timeout', () =>
      call.destroy(new Error(`No answer from ${new URL(url).pathname} for a minute.`)),
    );
    call.once('response', (response) => {
      text(response).then((body) => {
        const status = response.statusCode ?? 0;
        if (status >= 200 && status < 300) resolve(body);
        else
          reject(new Error(`${method} ${new URL(url).pathname} answered ${status}: ${body.slice(0, 300)}`));
      }, reject);
    });
    call.end(bytes);
  });
}
