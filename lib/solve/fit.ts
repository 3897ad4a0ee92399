import { DEFAULT_PARTICLES } from '@/lib/casefile/defaults';
import type { Issue } from '@/lib/casefile/issue';
import type { Problem } from '@/lib/evidence/problem';
import { log } from '@/lib/numerics/elementary';
import { type Cloud, NothingPossible, temper } from '@/lib/numerics/particles';
import { meanAndSd } from '@/lib/numerics/quantile';
import { normalQuantiles } from '@/lib/numerics/normal';
import { fillUniforms, seededState } from '@/lib/numerics/random';
import { type Central, solvedAt } from './central';
import type { FigureName } from './columns';
import { Kernel } from './kernel';
import { placeParticles, standardised, unknownsOf, weighParticles } from './likelihood';
import { type FitFound, type Solution, counted, joined } from './solution';
import { isSimulated } from './solve';
import type { RunTasks, Task } from './task';

/** Particles at most in the second run, which is there to disagree. */
const SECOND = 1000;
/** Particles a task. */
const PER_TASK = { closed: 1024, simulated: 64 };

export type Fitted = { kind: 'fitted'; solution: Solution } | { kind: 'refused'; reason: Issue };

/** The figures whose means the two runs must agree in. */
const JUDGED = ['A.approachSpeed', 'B.approachSpeed', 'A.deltaV', 'B.deltaV'] as const satisfies FigureName[];

/**
 * The method fit: every unknown of the forward model weighed against all the evidence by sequential Monte Carlo
 * (numerics/particles.ts), twice. Random numbers are made here and particles weighed in tasks, so that any number of
 * workers gives the same digits.
 */
export async function solveFit(
  problem: Problem,
  asked: number | 'auto',
  run: RunTasks,
  onProgress?: (done: number) => void,
): Promise<Fitted> {
  const n = asked === 'auto' ? DEFAULT_PARTICLES : asked;
  const weigh = weigher(problem, run);
  const likelihood = { dimension: unknownsOf(problem).length, weigh };
  if (likelihood.dimension === 0)
    return refused('vehicles', 'nothing is unknown here: a fit needs an unknown that the evidence can tell of');
  try {
    const first = await temper(likelihood, n, problem.seed, 'fit', (beta) => onProgress?.(0.8 * beta));
    const second = await temper(likelihood, Math.min(n, SECOND), problem.seed, 'fit (second run)', (beta) =>
      onProgress?.(0.8 + 0.2 * beta),
    );
    const [figures, again] = [await figuresOf(problem, first.z, run), await figuresOf(problem, second.z, run)];
    const central = centralOf(problem, first);
    return { kind: 'fitted', solution: { ...figures, central, fit: foundOf(central, first, second, figures, again) } };
  } catch (error) {
    if (error instanceof NothingPossible)
      return refused('impact', 'no state of what is unknown lets the vehicles touch and part as the case is drawn');
    throw error;
  }
}

const refused = (path: string, says: string): Fitted => ({ kind: 'refused', reason: { path, says } });

/** Cuts particles into tasks. */
function cut(problem: Problem, z: Float64Array, kind: 'weigh' | 'figures'): Task[] {
  const size = (isSimulated(problem) ? PER_TASK.simulated : PER_TASK.closed) * unknownsOf(problem).length;
  return Array.from({ length: Math.ceil(z.length / size) }, (_, i) => ({ kind, z: z.slice(i * size, (i + 1) * size) }));
}

const weigher =
  (problem: Problem, run: RunTasks) =>
  async (z: Float64Array): Promise<Float64Array> => {
    const parts = await run(problem, cut(problem, z, 'weigh'));
    const all = new Float64Array(z.length / unknownsOf(problem).length);
    let at = 0;
    for (const part of parts)
      if (part.kind === 'weighed') {
        all.set(part.logLikelihood, at);
        at += part.logLikelihood.length;
      }
    return all;
  };

async function figuresOf(problem: Problem, z: Float64Array, run: RunTasks): Promise<Omit<Solution, 'central' | 'fit'>> {
  const parts = (await run(problem, cut(problem, z, 'figures'))).filter((part) => part.kind === 'draws');
  return {
    problem,
    draws: parts.reduce((sum, part) => sum + part.draws, 0),
    values: joined(parts),
    impossible: counted(parts),
    traced: [],
    sobol: [],
  };
}

/** log of the prior density of an unknown at z, up to a constant, in its own units. */
function logPrior({ spread, value }: Problem['inputs'][number], z: number, x: number): number {
  if (spread.shape === 'normal') return -(z * z) / 2;
  if (spread.shape !== 'triangular') return 0;
  return log(
    Math.max(1e-300, x < value ? (x - spread.low) / (value - spread.low) : (spread.high - x) / (spread.high - value)),
  );
}

/** Tries to climb from the best particle to the state of highest posterior density. */
const CLIMBS = 400;

/** The state of highest posterior density: the best particle, and from there uphill by ever shorter steps. */
function centralOf(problem: Problem, cloud: Cloud): Central {
  const slots = unknownsOf(problem);
  const d = slots.length;
  const kernel = new Kernel(problem);
  const density = (z: Float64Array, logL: number): number => {
    placeParticles(kernel, z, 0, 1);
    return slots.reduce((sum, slot, i) => sum + logPrior(problem.inputs[slot], z[i], kernel.inputs[slot][0]), logL);
  };
  const particle = (k: number): Float64Array => cloud.z.slice(k * d, (k + 1) * d);
  const scores = Array.from(cloud.logLikelihood, (logL, k) => density(particle(k), logL));
  const top = scores.indexOf(Math.max(...scores.filter(Number.isFinite)));
  let [z, best] = [particle(top), scores[top]];
  const widths = slots.map((_, i) => meanAndSd(cloud.logLikelihood.map((__, k) => cloud.z[k * d + i])).sd);
  const steps = new Float64Array(d);
  for (let i = 0; i < CLIMBS; i++) {
    fillUniforms(seededState(problem.seed, 'fit (climb)', i), steps, d);
    normalQuantiles(steps, d);
    const length = 0.5 * (1 - i / CLIMBS);
    const trial = z.map((v, j) => v + length * widths[j] * steps[j]);
    const score = density(trial, weighParticles(problem, trial)[0]);
    if (score > best) [z, best] = [trial, score];
  }
  placeParticles(kernel, z, 0, 1);
  const inputs = problem.inputs.map((input, slot) => ({ ...input, value: kernel.inputs[slot][0] }));
  return solvedAt({ ...problem, inputs }, { A: null, B: null });
}

function foundOf(
  central: Central,
  first: Cloud,
  second: Cloud,
  figures: Pick<Solution, 'values'>,
  again: Pick<Solution, 'values'>,
): FitFound {
  const { problem } = central;
  const kernel = new Kernel(problem);
  kernel.solveCentral();
  const slots = unknownsOf(problem);
  const variance = (i: number): number =>
    meanAndSd(first.logLikelihood.map((_, k) => first.z[k * slots.length + i])).sd ** 2;
  return {
    logEvidence: first.logEvidence,
    effectiveSize: first.effectiveSize,
    acceptance: first.acceptance,
    temperatures: first.temperatures,
    residuals: Object.fromEntries(
      (problem.fit?.observations ?? []).map((observation) => [observation.path, standardised(observation, kernel, 0)]),
    ),
    contraction: Object.fromEntries(slots.map((slot, i) => [problem.inputs[slot].path, 1 - variance(i)])),
    secondRun: { logEvidence: second.logEvidence, disagreement: disagreement(figures, again) },
  };
}

function disagreement(a: Pick<Solution, 'values'>, b: Pick<Solution, 'values'>): number {
  const apart = JUDGED.map((name) => {
    const [p, q] = [meanAndSd(a.values[name]), meanAndSd(b.values[name])];
    const size = Math.max(p.sd, q.sd);
    return size > 0 ? Math.abs(p.mean - q.mean) / size : 0;
  });
  return Math.max(...apart);
}
