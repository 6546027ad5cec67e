/** What a page's script gets when the API says no. `detail` is written for people. */
export class ApiError extends Error {
  constructor(
    readonly status: number,
    readonly detail: string,
    readonly errors: { path: string; message: string }[] = [],
    readonly retryAfterSeconds: number | null = null,
  ) {
    super(detail);
    this.name = 'ApiError';
  }
}

type Options = {
  method?: string;
  json?: unknown;
  body?: BodyInit;
  version?: number;
  headers?: Record<string, string>;
  idempotencyKey?: string;
};

/** The browser's way to the API: JSON in and out, `If-Match` from a version, problems as ApiError. */
export async function api<T>(path: string, options: Options = {}): Promise<T> {
  const headers = new Headers(options.headers);
  if (options.json !== undefined) headers.set('content-type', 'application/json');
  if (options.version !== undefined) headers.set('if-match', `"${options.version}"`);
  if (options.idempotencyKey) headers.set('idempotency-key', options.idempotencyKey);
  let response: Response;
  try {
    response = await fetch(path, {
      method: options.method ?? (options.json !== undefined ? 'POST' : 'GET'),
      headers,
      body: options.json !== undefined ? JSON.stringify(options.json) : options.body,
      credentials: 'same-origin',
    });
  } catch {
    throw new ApiError(
      0,
      'The server cannot be reached. What you typed is still here; try again when the network is back.',
    );
  }
  if (response.status === 204) return undefined as T;
  const answer = (await response.json().catch(() => null)) as Record<string, unknown> | null;
  if (response.ok) return answer as T;
  throw new ApiError(
    response.status,
    (answer?.detail as string) ?? `The server answered ${response.status}. Try again.`,
    (answer?.errors as { path: string; message: string }[]) ?? [],
    Number(response.headers.get('retry-after')) || null,
  );
}

/** The fetcher for swr. */
export const fetcher = <T>(path: string): Promise<T> => api<T>(path);
