/** Names of files as they travel in HTTP headers. Nothing here touches a file system. */

/** Keeps the last part of a path, drops control and direction-changing characters, and shortens to 200 characters. */
export function cleanFileName(given: string, fallback = 'unnamed'): string {
  const last = given.normalize('NFC').split(/[\\/]/).at(-1) ?? '';
  const printable = last
    .replace(/[\u0000-\u001f\u007f-\u009f\u200e\u200f\u202a-\u202e\u2066-\u2069]/g, '')
    .trim();
  if (printable === '' || /^\.+$/.test(printable)) return fallback;
  const characters = [...printable];
  if (characters.length <= 200) return printable;
  const dot = printable.lastIndexOf('.');
  const ending = dot > 0 && printable.length - dot <= 12 ? printable.slice(dot) : '';
  return characters.slice(0, 200 - ending.length).join('') + ending;
}

function decodePercent(text: string, charset: string): string | null {
  try {
    if (charset.toLowerCase() === 'utf-8') return decodeURIComponent(text);
    return text.replace(/%([0-9a-f]{2})/gi, (_all, hex: string) => String.fromCharCode(parseInt(hex, 16)));
  } catch {
    return null;
  }
}

/**
 * The name in an `X-Filename` header: an RFC 8187 value (`UTF-8''plate%20%CE%B1.jpg`), a quoted or plain text, or a
 * percent-encoded one. Header text that is raw UTF-8 arrives byte by byte and is put together again. Null when it
 * cannot be read.
 */
export function readFileNameHeader(header: string): string | null {
  const extended = /^(utf-8|iso-8859-1)'[^']*'(.*)$/i.exec(header.trim());
  if (extended) return decodePercent(extended[2]!, extended[1]!);
  let text = header.trim();
  if (text.startsWith('"') && text.endsWith('"') && text.length >= 2)
    text = text.slice(1, -1).replace(/\\(.)/g, '$1');
  if (/[\u0080-\u00ff]/.test(text) && !/[^\u0000-\u00ff]/.test(text)) {
    const bytes = Uint8Array.from(text, (character) => character.charCodeAt(0));
    try {
      text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    } catch {
      // Latin-1 after all: it stays as it is.
    }
  }
  return /%[0-9a-f]{2}/i.test(text) ? (decodePercent(text, 'utf-8') ?? text) : text;
}

/** `Content-Disposition` with an ASCII name for old readers and the true one (RFC 6266, RFC 8187). */
export function contentDisposition(kind: 'inline' | 'attachment', fileName: string): string {
  const ascii = fileName.replace(/[^\x20-\x7e]/g, '_').replace(/["\\%]/g, '_');
  const extended = encodeURIComponent(fileName).replace(
    /['()*]/g,
    (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `${kind}; filename="${ascii}"; filename*=UTF-8''${extended}`;
}
