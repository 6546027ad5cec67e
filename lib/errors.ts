/**
 * The one table of error codes. `status` follows the HTTP contract; `title` is the short, stable
 * summary of RFC 9457. What happened and what to do next goes into `detail` where it is thrown.
 */
export const errorTable = {
  malformed: { status: 400, title: 'The request could not be read' },
  'digest-mismatch': { status: 400, title: 'The bytes do not match their digest' },
  'not-signed-in': { status: 401, title: 'Sign in first' },
  'not-allowed': { status: 403, title: 'You may not do this' },
  'password-change-due': { status: 403, title: 'Change your password first' },
  'foreign-origin': { status: 403, title: 'The request came from another site' },
  'not-found': { status: 404, title: 'Not found' },
  'method-not-allowed': { status: 405, title: 'This address does not take that method' },
  'state-conflict': { status: 409, title: 'Not possible in the present state' },
  'version-conflict': { status: 409, title: 'Somebody changed this in the meantime' },
  'already-exists': { status: 409, title: 'This exists already' },
  'precondition-failed': { status: 412, title: 'The precondition does not hold' },
  'too-large': { status: 413, title: 'Too large' },
  'unsupported-type': { status: 415, title: 'Not a type that Heartcut takes' },
  invalid: { status: 422, title: 'The content is not valid' },
  'version-required': { status: 428, title: 'Say which version you changed' },
  'too-many': { status: 429, title: 'Too many requests' },
  internal: { status: 500, title: 'Something went wrong on our side' },
  unavailable: { status: 503, title: 'A service is away' },
} as const;

export type ErrorCode = keyof typeof errorTable;
export type FieldError = { path: string; message: string };

/** An error that a caller may see. `detail` says what to do next; it never holds SQL, paths or stacks. */
export class Problem extends Error {
  constructor(
    readonly code: ErrorCode,
    readonly detail: string,
    readonly extra: { errors?: FieldError[]; retryAfterSeconds?: number } = {},
  ) {
    super(`${code}: ${detail}`);
    this.name = 'Problem';
  }

  get status(): number {
    return errorTable[this.code].status;
  }
}

/** The same 404 for what does not exist and for what the caller's groups may not see. */
export function notFound(what: string): Problem {
  return new Problem(
    'not-found',
    `There is no ${what} that you can see. Check the code or ask for access to its group.`,
  );
}

/** A 422 for one field. `path` is the field's name as sent. */
export function invalidField(path: string, message: string): Problem {
  return new Problem('invalid', message, { errors: [{ path, message }] });
}
