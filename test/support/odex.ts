import { createRequire } from 'node:module';

/**
 * Hairer & Wanner's extrapolation code, from odex 2.0.4. It brings no declarations, but its TypeScript source lies beside
 * the program, which the compiler and tsx would take instead: hence `require`, and a type of our own.
 */
interface Solver {
  maxSteps: number;
  /** 0: no limit. */
  maxStepSize: number;
  relativeTolerance: number;
  absoluteTolerance: number;
  /** Calls `seen` after every accepted step, and at the start with xOld = x; `false` ends the run. */
  solve(
    f: (x: number, y: number[]) => number[],
    x: number,
    y: readonly number[],
    xEnd: number,
    seen: (step: number, xOld: number, x: number, y: number[]) => boolean | void,
  ): unknown;
}

const require = createRequire(import.meta.url);

export const { Solver } = require('odex') as { Solver: new (dimension: number) => Solver };
