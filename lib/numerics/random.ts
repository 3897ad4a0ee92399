/**
 * Random numbers: xoshiro128++ (Blackman & Vigna 2021, «Scrambled linear pseudorandom number generators», ACM TOMS 47-4),
 * seeded afresh for every (seed, stream, block). So draw k of a stream depends on nothing else: not on the other streams,
 * nor on how many workers share the blocks.
 */

/** The four words of a generator's state. */
export type RandomState = Int32Array;

const rotateLeft = (x: number, by: number): number => (x << by) | (x >>> (32 - by));

/**
 * Fills out[0 .. count - 1] with uniform numbers of the open interval (0, 1): odd multiples of 2^-53, so neither 0 nor 1 nor
 * anything that rounds to them. Each takes the upper 26 bits of two numbers of the generator, whose step is written out
 * twice over local variables because every draw of every input passes here.
 */
export function fillUniforms(state: RandomState, out: Float64Array, count: number): void {
  let s0 = state[0];
  let s1 = state[1];
  let s2 = state[2];
  let s3 = state[3];
  for (let k = 0; k < count; k++) {
    const high = (rotateLeft((s0 + s3) | 0, 7) + s0) >>> 6;
    let shifted = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= shifted;
    s3 = rotateLeft(s3, 11);
    const low = (rotateLeft((s0 + s3) | 0, 7) + s0) >>> 6;
    shifted = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= shifted;
    s3 = rotateLeft(s3, 11);
    out[k] = (high * 67108864 + low + 0.5) * 2.220446049250313e-16;
  }
  state.set([s0, s1, s2, s3]);
}

/** One round of HalfSipHash (Aumasson & Bernstein, reference implementation). */
function stir(v: RandomState): void {
  v[0] += v[1];
  v[1] = rotateLeft(v[1], 5) ^ v[0];
  v[0] = rotateLeft(v[0], 16);
  v[2] += v[3];
  v[3] = rotateLeft(v[3], 8) ^ v[2];
  v[0] += v[3];
  v[3] = rotateLeft(v[3], 7) ^ v[0];
  v[2] += v[1];
  v[1] = rotateLeft(v[1], 13) ^ v[2];
  v[2] = rotateLeft(v[2], 16);
}

function absorb(v: RandomState, word: number): void {
  v[3] ^= word;
  stir(v);
  stir(v);
  v[0] ^= word;
}

/**
 * The state at the start of a block. `seed` 0 .. 2^53 - 1, `stream` any string, `block` 0 .. 2^32 - 1: the seed is the key of
 * HalfSipHash-2-4, block and characters are the message, and the whole inner state is kept.
 */
export function seededState(seed: number, stream: string, block: number): RandomState {
  const low = seed | 0;
  const high = Math.floor(seed / 4294967296) | 0;
  const v: RandomState = Int32Array.of(low, high, 0x6c796765 ^ low, 0x74656462 ^ high);
  absorb(v, block);
  for (let i = 0; i < stream.length; i++) absorb(v, stream.charCodeAt(i));
  v[2] ^= 0xff;
  for (let round = 0; round < 4; round++) stir(v);
  if ((v[0] | v[1] | v[2] | v[3]) === 0) v[0] = 1; // the one state that the generator never leaves
  return v;
}
