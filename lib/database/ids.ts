import { v7 } from 'uuid';

/** A new record id: UUID version 7 (RFC 9562), so that ids sort by the time they were made. */
export function newId(): string {
  return v7();
}

const pattern = /^[0-9a-f]{8}-[0-9a-f]{4}-[1-8][0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/i;

export function isId(text: string): boolean {
  return pattern.test(text);
}
