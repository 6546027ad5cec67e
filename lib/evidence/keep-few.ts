/**
 * Remembers the last few results of costly work by a key, also while they are still being made; failures are
 * forgotten at once.
 */
export function keepFew<T>(most: number): (key: string, make: () => Promise<T>) => Promise<T> {
  const kept = new Map<string, Promise<T>>();
  return (key, make) => {
    const known = kept.get(key);
    if (known) return known;
    const made = make();
    kept.set(key, made);
    made.catch(() => kept.delete(key));
    const [oldest] = kept.keys();
    if (kept.size > most && oldest !== undefined) kept.delete(oldest);
    return made;
  };
}
