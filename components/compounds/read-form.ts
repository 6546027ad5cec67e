import { ApiError } from '@/lib/http/client';
import { parseQuantity } from '@/lib/units/quantity-text';

/** The text of a field, or null where it is empty or absent. */
export function textOf(form: FormData, name: string): string | null {
  const value = form.get(name);
  return typeof value === 'string' && value.trim() !== '' ? value.trim() : null;
}

/** The number of a field, with a comma or a point; null where it is empty. @throws ApiError that names the field. */
export function numberOf(form: FormData, name: string): number | null {
  const text = textOf(form, name);
  if (text === null) return null;
  const parsed = parseQuantity(text, {}, '', '1.4720');
  if (parsed.ok) return parsed.value;
  throw new ApiError(422, parsed.problem, [{ path: name, message: parsed.problem }]);
}
