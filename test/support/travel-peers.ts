import cashKarp from 'ode45-cash-karp';
import type { Rest, TyreMotion } from '@/lib/mechanics/spin';
import { Solver } from './odex';

/**
 * Travel to rest by integrators from outside the project, on the project's own equations of motion and test of rest: the
 * extrapolation code of Hairer & Wanner (odex) and the fifth-order pair of Cash & Karp (1990).
 */

const LONGEST = 300;

/** A moment, the motion then and its derivative. */
interface Moment {
  t: number;
  y: Float64Array;
  dy: Float64Array;
}

function momentOf(motion: TyreMotion, t: number, state: ArrayLike<number>): Moment {
  const y = Float64Array.from(state);
  const dy = new Float64Array(6);
  motion.derivative(t, y, dy);
  return { t, y, dy };
}

const restAt = (outcome: Rest['outcome'], t: number, y: ArrayLike<number>): Rest => ({
  outcome,
  x: y[0],
  y: y[1],
  heading: y[2],
  time: t,
});

/** The first moment of rest within a step that ends at rest, by bisection on the cubic through both ends. */
function firstRest(motion: TyreMotion, from: Moment, to: Moment): Rest {
  const h = to.t - from.t;
  const y = new Float64Array(6);
  const stateAt = (s: number): void => {
    const [a, b] = [s * s * (3 - 2 * s), s * (1 - s) * h];
    for (let i = 0; i < 6; i++)
      y[i] = from.y[i] + a * (to.y[i] - from.y[i]) + b * ((1 - s) * from.dy[i] - s * to.dy[i]);
  };
  let [early, late] = [0, 1];
  for (let i = 0; i < 40; i++) {
    const middle = (early + late) / 2;
    stateAt(middle);
    if (motion.unrest(y) <= 1) late = middle;
    else early = middle;
  }
  stateAt(late);
  return restAt('rest', from.t + late * h, y);
}

/** `longest`: the longest step, s; 0 where odex is free to choose. */
export function odexToRest(motion: TyreMotion, start: readonly number[], tolerance: number, longest = 0): Rest {
  const solver = new Solver(6);
  solver.absoluteTolerance = tolerance;
  solver.relativeTolerance = tolerance;
  solver.maxSteps = 1_000_000;
  solver.maxStepSize = longest;
  const y = new Float64Array(6);
  const dy = new Float64Array(6);
  const f = (t: number, state: number[]): number[] => {
    y.set(state);
    motion.derivative(t, y, dy);
    return Array.from(dy);
  };
  let before: readonly number[] = start;
  let rest = restAt('noRest', LONGEST, start);
  solver.solve(f, 0, start, LONGEST, (_, tBefore, t, now) => {
    y.set(now);
    if (motion.unrest(y) <= 1) {
      rest = firstRest(motion, momentOf(motion, tBefore, before), momentOf(motion, t, now));
      return false;
    }
    before = now;
  });
  return rest;
}

export function cashKarpToRest(motion: TyreMotion, start: readonly number[], tolerance: number): Rest {
  const f = (dy: Float64Array, y: Float64Array, t: number): void => motion.derivative(t, y, dy);
  const options = { tol: tolerance, verbose: false, errorScaleFunction: () => 1 };
  const run = cashKarp(Float64Array.from(start), f, 0, 1e-3, options);
  const before = Float64Array.from(start);
  let t = 0;
  while (motion.unrest(run.y) > 1) {
    if (run.t > LONGEST) return restAt('noRest', run.t, run.y);
    before.set(run.y);
    t = run.t;
    run.step();
  }
  return firstRest(motion, momentOf(motion, t, before), momentOf(motion, run.t, run.y));
}
