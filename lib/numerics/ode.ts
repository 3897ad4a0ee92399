/** Right-hand side of y' = f(t, y): writes the derivative. */
export type Derivative = (t: number, y: Float64Array, dy: Float64Array) => void;

/**
 * One-step integrator of Bogacki & Shampine (1989), order 3 with an embedded order 2, first same as last. The caller
 * controls the step: `try` makes a trial from (t, y) and leaves the state in `next` and the error estimate in `error`;
 * `accept` moves on.
 */
export class BogackiShampine {
  readonly y: Float64Array;
  readonly next: Float64Array;
  readonly error: Float64Array;
  /** Derivative at (t, y) and, after a trial, at its end. */
  dy: Float64Array;
  dyNext: Float64Array;
  private readonly k2: Float64Array;
  private readonly k3: Float64Array;
  t: number;

  constructor(
    private readonly f: Derivative,
    t: number,
    y: ArrayLike<number>,
  ) {
    const fresh = (): Float64Array => new Float64Array(y.length);
    this.t = t;
    this.y = new Float64Array(y);
    [this.next, this.error, this.dy, this.dyNext, this.k2, this.k3] = [
      fresh(),
      fresh(),
      fresh(),
      fresh(),
      fresh(),
      fresh(),
    ];
    f(t, this.y, this.dy);
  }

  try(h: number): void {
    const { y, next, error, dy: k1, k2, k3, dyNext: k4, t, f } = this;
    const n = y.length;
    for (let i = 0; i < n; i++) next[i] = y[i] + (h / 2) * k1[i];
    f(t + h / 2, next, k2);
    for (let i = 0; i < n; i++) next[i] = y[i] + ((3 * h) / 4) * k2[i];
    f(t + (3 * h) / 4, next, k3);
    for (let i = 0; i < n; i++) next[i] = y[i] + (h / 9) * (2 * k1[i] + 3 * k2[i] + 4 * k3[i]);
    f(t + h, next, k4);
    for (let i = 0; i < n; i++) error[i] = (h / 72) * (-5 * k1[i] + 6 * k2[i] + 8 * k3[i] - 9 * k4[i]);
  }

  accept(h: number): void {
    const { y, next, dy } = this;
    this.t += h;
    for (let i = 0; i < y.length; i++) y[i] = next[i];
    this.dy = this.dyNext;
    this.dyNext = dy;
  }

  /** The state a share s in [0, 1] of the way through the last trial of length h: cubic Hermite. */
  within(h: number, s: number, out: Float64Array): void {
    const { y, next, dy, dyNext } = this;
    const [a, b] = [s * s * (3 - 2 * s), s * (1 - s)];
    for (let i = 0; i < y.length; i++) out[i] = y[i] + a * (next[i] - y[i]) + b * h * ((1 - s) * dy[i] - s * dyNext[i]);
  }
}

/** The classical method of Runge and Kutta, order 4, with steps of one length: smooth in its inputs, as a search needs it. */
export class RungeKutta {
  private readonly k: Float64Array[];
  private readonly at: Float64Array;

  constructor(
    private readonly f: Derivative,
    length: number,
  ) {
    this.at = new Float64Array(length);
    this.k = [1, 2, 3, 4].map(() => new Float64Array(length));
  }

  /** Moves y from t to t + h. */
  step(t: number, h: number, y: Float64Array): void {
    const { f, at } = this;
    const [k1, k2, k3, k4] = this.k;
    f(t, y, k1);
    for (let i = 0; i < y.length; i++) at[i] = y[i] + (h / 2) * k1[i];
    f(t + h / 2, at, k2);
    for (let i = 0; i < y.length; i++) at[i] = y[i] + (h / 2) * k2[i];
    f(t + h / 2, at, k3);
    for (let i = 0; i < y.length; i++) at[i] = y[i] + h * k3[i];
    f(t + h, at, k4);
    for (let i = 0; i < y.length; i++) y[i] += (h / 6) * (k1[i] + 2 * k2[i] + 2 * k3[i] + k4[i]);
  }
}
