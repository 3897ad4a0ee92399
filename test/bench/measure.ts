/** Times of interleaved rounds, so that noise of the machine falls on both alike. */
export interface Compared {
  ours: number;
  peer: number;
  /** How many times faster ours is. */
  ratio: number;
}

const median = (values: number[]): number => {
  const sorted = [...values].sort((a, b) => a - b);
  return (sorted[(sorted.length - 1) >> 1] + sorted[sorted.length >> 1]) / 2;
};

async function timed(work: () => unknown): Promise<number> {
  const from = performance.now();
  await work();
  return performance.now() - from;
}

export async function medianTime(work: () => unknown, rounds: number): Promise<number> {
  await work();
  const times: number[] = [];
  for (let i = 0; i < rounds; i++) times.push(await timed(work));
  return median(times);
}

/** Medians of `rounds` interleaved rounds after one of warming up each; `perPeer`: how much more work the peer's round is. */
export async function compare(ours: () => unknown, peer: () => unknown, rounds = 7, perPeer = 1): Promise<Compared> {
  await ours();
  await peer();
  const [mine, theirs]: [number[], number[]] = [[], []];
  for (let i = 0; i < rounds; i++) {
    mine.push(await timed(ours));
    theirs.push((await timed(peer)) / perPeer);
  }
  return { ours: median(mine), peer: median(theirs), ratio: median(theirs) / median(mine) };
}

/** A line of the bench. */
export interface Line {
  id: string;
  what: string;
  goal: string;
  found: string;
}

export const times = (x: number): string => `${x.toFixed(x < 10 ? 2 : 0)} times`;
