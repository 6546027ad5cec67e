import { Problem } from '@/lib/errors';

/**
 * The record version of `If-Match: "7"`. 428 when absent, 412 when it is not one of ours. A weak tag (`W/"7"`)
 * never matches: If-Match compares strongly (RFC 9110, 13.1.1).
 */
export function requireIfMatch(request: Request): number {
  const header = request.headers.get('if-match');
  if (!header) {
    throw new Problem(
      'version-required',
      'Send the version that you changed: If-Match: "<version>". It is in the record as "version".',
    );
  }
  const match = /^\s*"(\d{1,9})"\s*$/.exec(header);
  if (!match)
    throw new Problem(
      'precondition-failed',
      'If-Match takes one version in quotes, for example If-Match: "3".',
    );
  return Number(match[1]);
}

/** 409 when the record has moved on since the caller read it. Call it with the row locked. */
export function requireSameVersion(record: { version: number }, version: number): void {
  if (record.version === version) return;
  throw new Problem(
    'version-conflict',
    `You changed version ${version}, but version ${record.version} is there now. Reload it, compare, then make your change again.`,
  );
}

export function entityTag(record: { version: number }): string {
  return `"${record.version}"`;
}
