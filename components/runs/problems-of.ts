import { ApiError } from '@/lib/http/client';
import type { Problems } from './read-form';

/** The problems that the server named, by field; `knownImpurities.2` counts for `knownImpurities`. */
export function problemsOf(error: unknown): Problems {
  if (!(error instanceof ApiError)) return {};
  return Object.fromEntries(error.errors.map(({ path, message }) => [path.split('.')[0]!, message]));
}

/** What to say of a failure as a whole. */
export function failureOf(error: unknown): string {
  return error instanceof ApiError ? error.detail : 'Something went wrong on this page. Try again.';
}

/** Takes whoever sent a form to the first field that needs another look, once it is marked. */
export function focusFirstProblem(form: HTMLFormElement): void {
  requestAnimationFrame(() => form.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus());
}
