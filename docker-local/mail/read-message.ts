export interface MessageSummary {
  from: string;
  to: string;
  subject: string;
  date: string;
  text: string;
}

const decodeQuotedPrintable = (text: string): Buffer =>
  Buffer.from(
    text
      .replace(/=\r?\n/g, '')
      .replace(/=([0-9A-Fa-f]{2})/g, (_, hex: string) => String.fromCharCode(parseInt(hex, 16))),
    'latin1',
  );

const decodeBytes = (bytes: Buffer, charset: string): string => {
  try {
    return new TextDecoder(charset).decode(bytes);
  } catch {
    return bytes.toString('utf8');
  }
};

/** Encoded words of a header, RFC 2047. */
function decodeWords(header: string): string {
  return header
    .replace(/(\?=)\s+(=\?)/g, '$1$2')
    .replace(/=\?([^?]+)\?([bq])\?([^?]*)\?=/gi, (_, charset: string, form: string, text: string) =>
      decodeBytes(
        form.toLowerCase() === 'b'
          ? Buffer.from(text, 'base64')
          : decodeQuotedPrintable(text.replace(/_/g, ' ')),
        charset,
      ),
    );
}

function split(raw: string): { headers: Map<string, string>; body: string } {
  const cut = /\r?\n\r?\n/.exec(raw);
  const head = (cut ? raw.slice(0, cut.index) : raw).replace(/\r?\n[ \t]+/g, ' ');
  const headers = new Map<string, string>();
  for (const line of head.split(/\r?\n/)) {
    const colon = line.indexOf(':');
    if (colon > 0) headers.set(line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim());
  }
  return { headers, body: cut ? raw.slice(cut.index + cut[0].length) : '' };
}

/** The plain text of a message: its own, or that of the first text/plain part (RFC 2045, RFC 2046). */
function findText(raw: string): string | null {
  const { headers, body } = split(raw);
  const type = headers.get('content-type') ?? 'text/plain';
  const boundary = /boundary="?([^";]+)"?/i.exec(type)?.[1];
  if (/^multipart\//i.test(type) && boundary) {
    const parts = body.split(`--${boundary}`).slice(1, -1);
    for (const part of parts) {
      const text = findText(part.replace(/^\r?\n/, ''));
      if (text !== null) return text;
    }
    return null;
  }
  if (!/^text\/plain/i.test(type)) return null;
  const encoding = (headers.get('content-transfer-encoding') ?? '7bit').toLowerCase();
  const charset = /charset="?([^";\s]+)"?/i.exec(type)?.[1] ?? 'utf-8';
  if (encoding === 'base64') return decodeBytes(Buffer.from(body, 'base64'), charset);
  if (encoding === 'quoted-printable') return decodeBytes(decodeQuotedPrintable(body), charset);
  return decodeBytes(Buffer.from(body, 'latin1'), charset);
}

/** What a person wants to see of a message. `raw` holds one byte a character (latin1). */
export function readMessage(raw: string): MessageSummary {
  const { headers } = split(raw);
  const header = (name: string) => decodeWords(headers.get(name) ?? '');
  return {
    from: header('from'),
    to: header('to'),
    subject: header('subject'),
    date: header('date'),
    text: (findText(raw) ?? '').replace(/\r\n/g, '\n').trimEnd(),
  };
}
