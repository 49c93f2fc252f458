const MASK_64 = (1n << 64n) - 1n;

/** A stream of uniform numbers. */
export interface UniformStream {
  /** The next whole number from 0 to 2³² − 1. */
  nextWord(): number;
  /** The next of 2⁵² evenly spaced numbers in the open interval from 0 to 1, from two words. */
  nextUniform(): number;
}

/**
 * xoshiro128** 1.1, period 2¹²⁸ − 1: 32-bit words suit this language, which has no fast 64-bit ones.
 *
 * Source: D. Blackman & S. Vigna, Scrambled linear pseudorandom number generators, ACM Trans. Math. Softw. 47 (2021), with
 * their reference implementation xoshiro128starstar.c.
 *
 * @param state four words, not all 0
 */
export function xoshiro(state: readonly [number, number, number, number]): UniformStream {
  // In an array of words: variables that a function keeps would be boxed anew at every step.
  const words = Int32Array.from(state);
  const nextWord = (): number => {
    const s0 = words[0] ?? 0;
    const s1 = words[1] ?? 0;
    const s2 = words[2] ?? 0;
    const s3 = words[3] ?? 0;
    const word = Math.imul(rotate(Math.imul(s1, 5), 7), 9) >>> 0;
    const third = s2 ^ s0;
    const fourth = s3 ^ s1;
    words[0] = s0 ^ fourth;
    words[1] = s1 ^ third;
    words[2] = third ^ (s1 << 9);
    words[3] = rotate(fourth, 11);
    return word;
  };
  // 26 bits of each, and half a step so that neither 0 nor 1 comes out: with 53 bits the half would be rounded away.
  const nextUniform = (): number => ((nextWord() >>> 6) * 2 ** 26 + (nextWord() >>> 6) + 0.5) * 2 ** -52;
  return { nextWord, nextUniform };
}

/**
 * The stream of a seed: its state is made by SplitMix64, as the authors of the generator advise.
 *
 * @param seed a whole number from 0 to 2⁵³ − 1
 */
export function seededStream(seed: number): UniformStream {
  if (!Number.isSafeInteger(seed) || seed < 0) throw new RangeError(`a seed is a whole number from 0, got ${seed}`);
  const { first, second } = splitMix(BigInt(seed));
  return xoshiro([word(first, 0n), word(first, 32n), word(second, 0n), word(second, 32n)]);
}

/** The first two outputs of SplitMix64 (G. Steele, D. Lea & C. Flood, Fast splittable generators, OOPSLA 2014). */
export function splitMix(seed: bigint): { first: bigint; second: bigint } {
  const GOLDEN_GAMMA = 0x9e3779b97f4a7c15n;
  const mixed = (state: bigint): bigint => {
    const once = ((state ^ (state >> 30n)) * 0xbf58476d1ce4e5b9n) & MASK_64;
    const twice = ((once ^ (once >> 27n)) * 0x94d049bb133111ebn) & MASK_64;
    return twice ^ (twice >> 31n);
  };
  return { first: mixed((seed + GOLDEN_GAMMA) & MASK_64), second: mixed((seed + 2n * GOLDEN_GAMMA) & MASK_64) };
}

function word(bits: bigint, shift: bigint): number {
  return Number((bits >> shift) & 0xffffffffn) | 0;
}

function rotate(bits: number, by: number): number {
  return (bits << by) | (bits >>> (32 - by));
}
