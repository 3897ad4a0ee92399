import { exp, log } from './elementary';
import { normalQuantiles } from './normal';
import { fillUniforms, seededState } from './random';

/**
 * Sequential Monte Carlo with a tempered likelihood (Del Moral, Doucet & Jasra 2006): a cloud of particles goes from the
 * prior, standard normal in every unknown, to the posterior in steps of the temperature; it gives the posterior and the
 * marginal likelihood. Particles lie one after another in a flat array. Knows no vehicle.
 */
export interface Likelihood {
  /** Number of unknowns. */
  dimension: number;
  /** log likelihood of each of the particles in z; -Infinity where one is impossible. */
  weigh: (z: Float64Array) => Promise<Float64Array>;
}

export interface Cloud {
  z: Float64Array;
  logLikelihood: Float64Array;
  /** log of the marginal likelihood. */
  logEvidence: number;
  /** Share of the proposed moves that were taken, over the whole run; number of temperatures and of rounds of moves. */
  acceptance: number;
  temperatures: number;
  rounds: number;
  /** Particles that differ from one another at the end. */
  effectiveSize: number;
}

/** A temperature is raised until the effective size falls to this share of the particles that are possible. */
const KEPT = 0.5;
/** Moves at a temperature go on until every particle has moved this often on average; at the last one longer. */
const MOVED = { along: 2, last: 6 };
const MOST_ROUNDS = 25;
/** A temperature is raised by at least this, so that a run ends; where the evidence is that sharp the two runs will disagree. */
const LEAST_STEP = 1e-4;

/** No particle of the prior is possible. */
export class NothingPossible extends Error {}

/** Runs `n` particles. `stream` names the random numbers; the run depends on it, the seed and the likelihood alone. */
export async function temper(
  { dimension, weigh }: Likelihood,
  n: number,
  seed: number,
  stream: string,
  onTemperature?: (beta: number) => void,
): Promise<Cloud> {
  const chance = new Chance(seed, stream);
  let z = chance.normals(n * dimension);
  let logL = await weigh(z);
  if (!logL.some((value) => value > -Infinity)) throw new NothingPossible();
  const walk = { scale: 0.6, tried: 0, taken: 0, rounds: 0 };
  let [beta, logEvidence, temperatures] = [0, 0, 0];
  while (beta < 1) {
    const next = nextTemperature(logL, beta);
    const weights = weightsOf(logL, next - beta);
    logEvidence += weights.logMean;
    beta = next;
    temperatures++;
    onTemperature?.(beta);
    const shape = shapeOf(z, weights.share, dimension);
    [z, logL] = resampled(z, logL, weights.share, dimension, chance.uniforms(1)[0]);
    await move({ z, logL, shape, beta, dimension, walk, chance, weigh });
  }
  const acceptance = walk.tried === 0 ? 1 : walk.taken / walk.tried;
  const distinct = new Set(Array.from({ length: n }, (_, k) => z[k * dimension])).size;
  return {
    z,
    logLikelihood: logL,
    logEvidence,
    acceptance,
    temperatures,
    rounds: walk.rounds,
    effectiveSize: distinct,
  };
}

/** Normal numbers are made so many at a time. */
const PART = 1024;

/** Random numbers of one run, drawn in order. */
class Chance {
  private block = 0;
  constructor(
    private readonly seed: number,
    private readonly stream: string,
  ) {}

  uniforms(n: number): Float64Array {
    const out = new Float64Array(n);
    fillUniforms(seededState(this.seed, this.stream, this.block++), out, n);
    return out;
  }

  normals(n: number): Float64Array {
    const out = this.uniforms(n);
    for (let at = 0; at < n; at += PART) normalQuantiles(out.subarray(at), Math.min(PART, n - at));
    return out;
  }
}

/** The next temperature, at most 1: there the effective size of the new weights is KEPT of the possible particles. */
function nextTemperature(logL: Float64Array, beta: number): number {
  const possible = logL.reduce((count, value) => count + (value > -Infinity ? 1 : 0), 0);
  const isKept = (step: number): boolean => effectiveSize(weightsOf(logL, step).share) >= KEPT * possible;
  if (isKept(1 - beta)) return 1;
  let [low, high] = [0, 1 - beta];
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (isKept(middle)) low = middle;
    else high = middle;
  }
  return Math.min(1, beta + Math.max(low, LEAST_STEP));
}

const effectiveSize = (share: Float64Array): number => 1 / share.reduce((sum, w) => sum + w * w, 0);

/** Normalised weights of the likelihood to a power, and the log of the mean weight. */
function weightsOf(logL: Float64Array, power: number): { share: Float64Array; logMean: number } {
  const most = logL.reduce((a, b) => Math.max(a, b), -Infinity);
  const share = logL.map((value) => exp(power * (value - most)));
  const sum = share.reduce((a, b) => a + b, 0);
  return { share: share.map((w) => w / sum), logMean: power * most + log(sum / logL.length) };
}

/** Mean of the cloud and a root of its covariance (lower triangle, by rows). */
interface CloudShape {
  mean: Float64Array;
  root: Float64Array;
}

function shapeOf(z: Float64Array, share: Float64Array, d: number): CloudShape {
  const mean = new Float64Array(d);
  const covariance = new Float64Array(d * d);
  for (let k = 0; k < share.length; k++) for (let i = 0; i < d; i++) mean[i] += share[k] * z[k * d + i];
  for (let k = 0; k < share.length; k++)
    for (let i = 0; i < d; i++)
      for (let j = 0; j <= i; j++)
        covariance[i * d + j] += share[k] * (z[k * d + i] - mean[i]) * (z[k * d + j] - mean[j]);
  return { mean, root: cholesky(covariance, d) };
}

/** Never narrower than this in any direction, so that a cloud that has shrunk to a point can open again. */
const NARROWEST = 1e-8;

function cholesky(a: Float64Array, d: number): Float64Array {
  const L = new Float64Array(d * d);
  for (let i = 0; i < d; i++)
    for (let j = 0; j <= i; j++) {
      let sum = a[i * d + j];
      for (let k = 0; k < j; k++) sum -= L[i * d + k] * L[j * d + k];
      L[i * d + j] = i === j ? Math.sqrt(Math.max(sum, NARROWEST)) : sum / L[j * d + j];
    }
  return L;
}

/** Systematic resampling (Kitagawa 1996). */
function resampled(
  z: Float64Array,
  logL: Float64Array,
  share: Float64Array,
  d: number,
  offset: number,
): [Float64Array, Float64Array] {
  const n = share.length;
  const [zNew, logLNew] = [new Float64Array(z.length), new Float64Array(n)];
  let [from, passed] = [0, share[0]];
  for (let k = 0; k < n; k++) {
    while (passed < (k + offset) / n && from < n - 1) passed += share[++from];
    zNew.set(z.subarray(from * d, (from + 1) * d), k * d);
    logLNew[k] = logL[from];
  }
  return [zNew, logLNew];
}

interface Moving {
  z: Float64Array;
  logL: Float64Array;
  shape: CloudShape;
  beta: number;
  dimension: number;
  walk: { scale: number; tried: number; taken: number; rounds: number };
  chance: Chance;
  weigh: Likelihood['weigh'];
}

/**
 * Moves every particle, in place, by proposals that keep the normal distribution of the cloud (preconditioned Crank and
 * Nicolson, Cotter et al. 2013), taken by Metropolis and Hastings; the length of the steps follows the acceptance.
 */
async function move(moving: Moving): Promise<void> {
  const { walk, beta, logL } = moving;
  const enough = beta === 1 ? MOVED.last : MOVED.along;
  let moved = 0;
  for (let round = 0; round < MOST_ROUNDS && moved < enough; round++) {
    const taken = await moveOnce(moving);
    const rate = taken / logL.length;
    moved += rate;
    walk.tried += logL.length;
    walk.taken += taken;
    walk.rounds++;
    if (rate > 0.45) walk.scale = Math.min(1, walk.scale * 1.3);
    else if (rate < 0.25) walk.scale = Math.max(0.02, walk.scale * 0.7);
  }
}

async function moveOnce({ z, logL, shape, beta, dimension: d, walk, chance, weigh }: Moving): Promise<number> {
  const n = logL.length;
  const { scale } = walk;
  const kept = Math.sqrt(1 - scale * scale);
  const xi = chance.normals(n * d);
  const luck = chance.uniforms(n);
  const proposed = new Float64Array(n * d);
  const gained = new Float64Array(n);
  const [y, yNew] = [new Float64Array(d), new Float64Array(d)];
  for (let k = 0; k < n; k++) {
    const old = z.subarray(k * d, (k + 1) * d);
    const into = proposed.subarray(k * d, (k + 1) * d);
    whiten(old, shape, y);
    for (let i = 0; i < d; i++) yNew[i] = kept * y[i] + scale * xi[k * d + i];
    colour(yNew, shape, into);
    gained[k] = (squares(old) - squares(into) + squares(yNew) - squares(y)) / 2;
  }
  const logLNew = await weigh(proposed);
  let taken = 0;
  for (let k = 0; k < n; k++) {
    if (!(log(luck[k]) < gained[k] + beta * (logLNew[k] - logL[k]))) continue;
    z.set(proposed.subarray(k * d, (k + 1) * d), k * d);
    logL[k] = logLNew[k];
    taken++;
  }
  return taken;
}

const squares = (v: Float64Array): number => {
  let sum = 0;
  for (let i = 0; i < v.length; i++) sum += v[i] * v[i];
  return sum;
};

/** y with root y = z - mean. */
function whiten(z: Float64Array, { mean, root }: CloudShape, y: Float64Array): void {
  const d = y.length;
  for (let i = 0; i < d; i++) {
    let sum = z[i] - mean[i];
    for (let j = 0; j < i; j++) sum -= root[i * d + j] * y[j];
    y[i] = sum / root[i * d + i];
  }
}

/** z = mean + root y. */
function colour(y: Float64Array, { mean, root }: CloudShape, z: Float64Array): void {
  const d = y.length;
  for (let i = 0; i < d; i++) {
    let sum = mean[i];
    for (let j = 0; j <= i; j++) sum += root[i * d + j] * y[j];
    z[i] = sum;
  }
}
