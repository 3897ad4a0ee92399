/**
 * xoshiro128++ (Blackman & Vigna, 2019), seeded afresh for every (seed, stream, block): the same numbers on any number
 * of workers, and adding a stream does not move the others.
 */
export class Random {
  private s0 = 0;
  private s1 = 0;
  private s2 = 0;
  private s3 = 0;

  /** `seed`: 0 .. 2^53 - 1; `stream`: a hash of what is drawn (streamOf); `block`: 0 .. 2^32 - 1. */
  constructor(seed: number, stream: number, block: number) {
    let state = mix(seed >>> 0);
    const next = (word: number): number => (state = mix((state + 0x9e3779b9) ^ mix(word)));
    next(Math.floor(seed / 4294967296));
    next(stream);
    next(block);
    this.s0 = next(1);
    this.s1 = next(2);
    this.s2 = next(3);
    this.s3 = next(4) | 1; // never all zero
  }

  /** 32 bits, 0 .. 2^32 - 1. */
  bits(): number {
    const sum = (this.s0 + this.s3) | 0;
    const result = (((sum << 7) | (sum >>> 25)) + this.s0) >>> 0;
    const t = this.s1 << 9;
    this.s2 ^= this.s0;
    this.s3 ^= this.s1;
    this.s1 ^= this.s2;
    this.s0 ^= this.s3;
    this.s2 ^= t;
    this.s3 = (this.s3 << 11) | (this.s3 >>> 21);
    return result;
  }

  /** Uniform in the open interval (0, 1), 53 bits. */
  uniform(): number {
    const high = this.bits() >>> 5;
    const low = this.bits() >>> 6;
    return (high * 67108864 + low + 0.5) / 9007199254740992;
  }
}

/** Finalizer of MurmurHash3 (Appleby): spreads 32 bits. */
function mix(h: number): number {
  h = Math.imul(h ^ (h >>> 16), 0x85ebca6b);
  h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35);
  return (h ^ (h >>> 16)) >>> 0;
}

/** FNV-1a hash of a name, 32 bits: the number of its stream. */
export function streamOf(name: string): number {
  let hash = 0x811c9dc5;
  for (let i = 0; i < name.length; i++) hash = Math.imul(hash ^ name.charCodeAt(i), 0x01000193);
  return hash >>> 0;
}
