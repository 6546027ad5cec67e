/** Repeatable chance: the same text gives the same numbers, so the demo laboratory is the same on every machine. */
export interface Chance {
  /** 0 to 1. */
  uniform(): number;
  /** Mean 0, standard deviation 1 (Box-Muller). */
  normal(): number;
}

/** FNV-1a, 32 bits: turns a text into a seed. */
function seedOf(text: string): number {
  let hash = 0x811c9dc5;
  for (const sign of text) hash = Math.imul(hash ^ (sign.codePointAt(0) ?? 0), 0x01000193);
  return hash >>> 0;
}

/** A generator of its own for each purpose (mulberry32), so that adding one does not move the others. */
export function chanceFor(purpose: string): Chance {
  let state = seedOf(purpose);
  const uniform = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  const normal = () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
  return { uniform, normal };
}
