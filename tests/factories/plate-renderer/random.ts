export type Random = {
  /** Evenly spread between the limits. */
  between: (low: number, high: number) => number;
  whole: (low: number, high: number) => number;
  pick: <T>(list: readonly T[]) => T;
  chance: (share: number) => boolean;
  /** Standard normal. */
  normal: () => number;
};

/** Repeatable random numbers: a 32-bit counter mixed by multiplication and shifts; Box-Muller for the normal. */
export function seededRandom(seed: number): Random {
  let state = (seed * 2654435761) >>> 0;
  const next = () => {
    state = (state + 0x9e3779b9) >>> 0;
    let mixed = state;
    mixed = Math.imul(mixed ^ (mixed >>> 16), 0x85ebca6b);
    mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
    return ((mixed ^ (mixed >>> 16)) >>> 0) / 4294967296;
  };
  return {
    between: (low, high) => low + (high - low) * next(),
    whole: (low, high) => low + Math.floor((high - low + 1) * next()),
    pick: (list) => list[Math.floor(list.length * next())]!,
    chance: (share) => next() < share,
    normal: () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next()),
  };
}
