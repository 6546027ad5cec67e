/** The search text and the cursor in a page's address; what is given twice or is not text counts as absent. */
export function readListAddress(given: Record<string, string | string[] | undefined>): {
  q?: string;
  cursor?: string;
} {
  const one = (name: string) => {
    const value = given[name];
    return typeof value === 'string' && value.trim() !== '' ? value.trim() : undefined;
  };
  return { q: one('q')?.slice(0, 200), cursor: one('cursor')?.slice(0, 500) };
}
