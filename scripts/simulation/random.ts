/** Numbers from 0 (included) to 1, the same ones for the same seed. */
export type Random = () => number;

/** A small generator of 32-bit state (mulberry32), ample for counting how often things happen. */
export function seededRandom(seed: number): Random {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let bits = Math.imul(state ^ (state >>> 15), 1 | state);
    bits = (bits + Math.imul(bits ^ (bits >>> 7), 61 | bits)) ^ bits;
    return ((bits ^ (bits >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** Anywhere within ±`halfWidth`, equally likely. */
export const rectangular = (random: Random, halfWidth: number) => (2 * random() - 1) * halfWidth;

/** Normal, mean 0 and standard deviation 1 (Box and Muller 1958). */
export const normal = (random: Random) =>
  Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
