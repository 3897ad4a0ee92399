/** What the tests use of ode45-cash-karp 1.1.0, which brings no declarations. */
declare module 'ode45-cash-karp' {
  interface Integrator {
    t: number;
    y: Float64Array;
    /** One accepted step. */
    step(): boolean;
  }
  export default function integrator(
    y: Float64Array,
    derivative: (dy: Float64Array, y: Float64Array, t: number) => void,
    t: number,
    step: number,
    options: {
      tol: number;
      verbose: boolean;
      errorScaleFunction?: (i: number, dt: number, y: number, dy: number) => number;
    },
  ): Integrator;
}
