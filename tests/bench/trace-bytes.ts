import { randomBytes } from 'node:crypto';
import { emgAt } from '../factories/emg-trace';

const pieceBytes = 1_000_000;

/** Text of one megabyte: an invented detector signal with peaks, a row a point. */
function writePiece(): string {
  const lines: string[] = [];
  let length = 0;
  for (let index = 0; length < pieceBytes; index += 1) {
    const minutes = index / 600;
    const signal =
      12 + emgAt({ atMin: 30, sigmaMin: 0.4, tauMin: 0.2, areaUnits: 900 }, minutes) + 0.02 * Math.sin(index);
    lines.push(`${minutes.toFixed(5)},${signal.toFixed(6)}`);
    length += lines.at(-1)!.length + 1;
  }
  return lines.join('\n').slice(0, pieceBytes);
}

let piece: Buffer | undefined;

/** `byteLength` of a table of time and signal, other bytes at each call: equal bytes would be one object. */
export function buildTraceBytes(byteLength: number): Buffer {
  piece ??= Buffer.from(writePiece());
  const bytes = Buffer.alloc(byteLength);
  for (let at = 0; at < byteLength; at += piece.length) {
    const end = at + piece.copy(bytes, at);
    // A remark at the end of each piece differs in every file.
    const remark = `\n# ${randomBytes(16).toString('hex')}\n`;
    if (end - at > remark.length) bytes.write(remark, end - remark.length);
  }
  bytes.write('time_min,signal_mV\n');
  return bytes;
}
