// Seeded chance, so that every demo is the same demo.

export interface Chance {
  /** 0 to 1. */
  next(): number;
  whole(from: number, to: number): number;
  pick<T>(choices: readonly T[]): T;
}

/** The generator known as mulberry32 (public domain, from memory). */
export function chanceOf(seed: number): Chance {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
  return {
    next,
    whole: (from, to) => from + Math.floor(next() * (to - from + 1)),
    pick: (choices) => {
      const found = choices[Math.floor(next() * choices.length)];
      if (found === undefined) throw new RangeError('nothing to pick from');
      return found;
    },
  };
}
