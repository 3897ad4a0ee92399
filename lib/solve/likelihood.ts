import type { Observation, Problem } from '@/lib/evidence/problem';
import { log } from '@/lib/numerics/elementary';
import { normalCumulative } from '@/lib/numerics/normal';
import { spreadUniforms } from '@/lib/numerics/spread';
import { type FigureName, columnOf } from './columns';
import type { Forward } from './forward';
import { BLOCK, Kernel } from './kernel';

/** The likelihood of a fit: how well the forward model of a particle explains every piece of evidence. */

const HALF_LOG_TWO_PI = 0.5 * log(2 * Math.PI);
const FULL_TURN = 2 * Math.PI;

/** The uncertain inputs of a problem: the unknowns of the fit, in the order of their standard normals. */
export const unknownsOf = ({ inputs }: Problem): number[] =>
  inputs.flatMap(({ spread }, slot) => (spread.shape === 'fixed' ? [] : [slot]));

/** Puts particles (flat, one after another) first .. first + count - 1 into a kernel's inputs, as rows 0 .. count - 1. */
export function placeParticles(kernel: Kernel, z: Float64Array, first: number, count: number): void {
  const slots = unknownsOf(kernel.problem);
  slots.forEach((slot, i) => {
    const column = kernel.inputs[slot];
    for (let k = 0; k < count; k++) column[k] = normalCumulative(z[(first + k) * slots.length + i]);
    spreadUniforms(column, count, kernel.problem.inputs[slot]);
  });
}

/** log likelihood of every particle. */
export function weighParticles(problem: Problem, z: Float64Array): Float64Array {
  const kernel = new Kernel(problem);
  const n = z.length / unknownsOf(problem).length;
  const logL = new Float64Array(n);
  for (let first = 0; first < n; first += BLOCK) {
    const count = Math.min(BLOCK, n - first);
    placeParticles(kernel, z, first, count);
    for (let k = 0; k < count; k++) {
      kernel.solve(k + 1, k);
      logL[first + k] = kernel.reasons[k] === 0 ? logLikelihood(kernel, k) : -Infinity;
    }
  }
  return logL;
}

function logLikelihood(kernel: Kernel, k: number): number {
  let sum = 0;
  for (const observation of kernel.problem.fit?.observations ?? []) sum += logDensity(observation, kernel, k);
  return Number.isNaN(sum) ? -Infinity : sum;
}

function logDensity(observation: Observation, kernel: Kernel, k: number): number {
  const r = standardised(observation, kernel, k);
  if (observation.of === 'energyBelow') return log(normalCumulative(r));
  return -(r * r) / 2 - log(observation.sd) - HALF_LOG_TWO_PI;
}

/** Observed less predicted, over the standard uncertainty of what was observed. */
export function standardised(observation: Observation, kernel: Kernel, k: number): number {
  const off = observation.value - predicted(observation, kernel, k);
  const whole = observation.of.endsWith('departureDirection') ? off - FULL_TURN * Math.round(off / FULL_TURN) : off;
  return whole / observation.sd;
}

/** What the forward model says of an observed quantity, SI and radians. */
function predicted({ of }: Observation, kernel: Kernel, k: number): number {
  const { forward } = kernel;
  if (!forward) return NaN;
  if (of === 'slide') return forward.contact?.slide ?? NaN;
  if (of === 'energyBelow') return kernel.columns.energyLost[k];
  const [whose, key] = of.split('.');
  if (whose === 'offset') return offset(forward, key as 'x');
  if (key?.startsWith('rest')) return poseOf(forward, whose as 'A', key.slice('rest'.length).toLowerCase() as 'x');
  return columnOf(kernel.columns, of as FigureName)[k];
}

const poseOf = (forward: Forward, id: 'A' | 'B', key: 'x' | 'y' | 'heading'): number => forward.rest[id]?.[key] ?? NaN;

const offset = (forward: Forward, key: 'x' | 'y' | 'heading'): number =>
  poseOf(forward, 'B', key) - poseOf(forward, 'A', key);
