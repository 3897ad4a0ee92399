import { cos, sin } from '@/lib/numerics/elementary';
import { type Contact, type ContactFrame, cross } from './contact-frame';
import type { TyreMotion } from './spin';

/**
 * Two vehicles that push on each other at a point while the road pushes on both. SI and radians, world axes.
 * A state is the motion of A (six numbers as in TyreMotion), that of B, and the impulses that the tyres have given to each.
 */
export const PAIR = { A: 0, B: 6, tyresA: 12, tyresB: 14, length: 16 } as const;

/** The body that carries the contact line; the contact point is fixed in the other. */
export type LineOn = 'A' | 'B';

/** Where the contact is at a moment: the point, the unit normal from A into B, and how the point lies to the line, m. */
export interface ContactPlace {
  px: number;
  py: number;
  nx: number;
  ny: number;
  /** How far the point is beyond the line into the other body, and where along the line. */
  depth: number;
  along: number;
}

/** A point fixed in one body and a line fixed in the other, as they lie at first touch. */
export class ContactLine {
  private readonly pointIn: [number, number];
  private readonly anchorIn: [number, number];
  private readonly normalAt0: [number, number];
  private readonly heading0: number;
  /** +1 where the point is in A: it goes deeper along the normal. */
  private readonly sense: number;
  private readonly pointAt: number;
  private readonly lineAt: number;

  constructor({ px, py }: Contact, { nx, ny }: ContactFrame, start: ArrayLike<number>, lineOn: LineOn) {
    this.sense = lineOn === 'B' ? 1 : -1;
    this.pointAt = lineOn === 'B' ? PAIR.A : PAIR.B;
    this.lineAt = lineOn === 'B' ? PAIR.B : PAIR.A;
    this.pointIn = intoBody(start, this.pointAt, px, py);
    this.anchorIn = intoBody(start, this.lineAt, px, py);
    this.normalAt0 = [nx, ny];
    this.heading0 = start[this.lineAt + 2];
  }

  /** Where point, line and normal are in a state of the pair. */
  place(y: ArrayLike<number>, out: ContactPlace): void {
    const { pointAt, lineAt, pointIn, anchorIn, normalAt0, sense } = this;
    const [cp, sp] = [cos(y[pointAt + 2]), sin(y[pointAt + 2])];
    out.px = y[pointAt] + cp * pointIn[0] - sp * pointIn[1];
    out.py = y[pointAt + 1] + sp * pointIn[0] + cp * pointIn[1];
    const [cl, sl] = [cos(y[lineAt + 2]), sin(y[lineAt + 2])];
    const ax = out.px - (y[lineAt] + cl * anchorIn[0] - sl * anchorIn[1]);
    const ay = out.py - (y[lineAt + 1] + sl * anchorIn[0] + cl * anchorIn[1]);
    const turned = y[lineAt + 2] - this.heading0;
    const [c, s] = [cos(turned), sin(turned)];
    out.nx = c * normalAt0[0] - s * normalAt0[1];
    out.ny = s * normalAt0[0] + c * normalAt0[1];
    out.depth = sense * (ax * out.nx + ay * out.ny);
    out.along = sense * (ay * out.nx - ax * out.ny);
  }
}

function intoBody(y: ArrayLike<number>, at: number, px: number, py: number): [number, number] {
  const [c, s] = [cos(y[at + 2]), sin(y[at + 2])];
  const [dx, dy] = [px - y[at], py - y[at + 1]];
  return [dx * c + dy * s, dy * c - dx * s];
}

/** dy/dt of both vehicles under their tyres and the grade, and what the tyres give. */
export function rollPair(A: TyreMotion, B: TyreMotion, t: number, y: Float64Array, dy: Float64Array): void {
  A.derivative(t, y, dy, PAIR.A);
  B.derivative(t, y, dy, PAIR.B);
  dy[PAIR.tyresA] = A.vehicle.m * (dy[PAIR.A + 3] - A.downhillX);
  dy[PAIR.tyresA + 1] = A.vehicle.m * (dy[PAIR.A + 4] - A.downhillY);
  dy[PAIR.tyresB] = B.vehicle.m * (dy[PAIR.B + 3] - B.downhillX);
  dy[PAIR.tyresB + 1] = B.vehicle.m * (dy[PAIR.B + 4] - B.downhillY);
}

/** Adds a contact force on B, and its opposite on A, at the point (px, py). */
export function pushPair(
  A: TyreMotion,
  B: TyreMotion,
  y: Float64Array,
  dy: Float64Array,
  { px, py }: ContactPlace,
  fx: number,
  fy: number,
): void {
  dy[PAIR.A + 3] -= fx / A.vehicle.m;
  dy[PAIR.A + 4] -= fy / A.vehicle.m;
  dy[PAIR.A + 5] -= cross(px - y[PAIR.A], py - y[PAIR.A + 1], fx, fy) / A.vehicle.I;
  dy[PAIR.B + 3] += fx / B.vehicle.m;
  dy[PAIR.B + 4] += fy / B.vehicle.m;
  dy[PAIR.B + 5] += cross(px - y[PAIR.B], py - y[PAIR.B + 1], fx, fy) / B.vehicle.I;
}

/** Velocity of the material of body at `at` under the point, m/s: x and y. */
const pointVelocity = (y: ArrayLike<number>, at: number, { px, py }: ContactPlace): [number, number] => [
  y[at + 3] - y[at + 5] * (py - y[at + 1]),
  y[at + 4] + y[at + 5] * (px - y[at]),
];

/** Velocity of A less that of B at the contact point, along the normal (closing > 0) and along t = perp(n), m/s. */
export function closingAt(y: ArrayLike<number>, place: ContactPlace, out: { un: number; ut: number }): void {
  const [ax, ay] = pointVelocity(y, PAIR.A, place);
  const [bx, by] = pointVelocity(y, PAIR.B, place);
  const [ux, uy] = [ax - bx, ay - by];
  out.un = ux * place.nx + uy * place.ny;
  out.ut = uy * place.nx - ux * place.ny;
}
