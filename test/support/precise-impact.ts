import type { Decimal } from 'decimal.js';
import type { ImpactBefore } from '@/lib/mechanics/impact';
import type { ImpactState } from '@/lib/mechanics/impact-backwards';
import { Precise, precise } from './precise';

/**
 * The impact in 50-digit decimals, forward and backward. Written from the mathematics with vectors and a 2 x 2 matrix, and
 * solved as linear equations where the engine has formulas, so that a slip in either shows.
 */

type Vector = [Decimal, Decimal];
type Figures = Record<string, Decimal>;

const ZERO = new Precise(0);
const dot = (a: Vector, b: Vector): Decimal => a[0].times(b[0]).plus(a[1].times(b[1]));
const cross = (a: Vector, b: Vector): Decimal => a[0].times(b[1]).minus(a[1].times(b[0]));
const plus = (a: Vector, b: Vector): Vector => [a[0].plus(b[0]), a[1].plus(b[1])];
const minus = (a: Vector, b: Vector): Vector => [a[0].minus(b[0]), a[1].minus(b[1])];
const times = (a: Vector, k: Decimal): Vector => [a[0].times(k), a[1].times(k)];
const perp = (a: Vector): Vector => [a[1].neg(), a[0]];
const vector = (x: number, y: number): Vector => [precise(x), precise(y)];

/** Solves [c1 c2] (x, y) = right by Cramer's rule. */
function solveTwo(c1: Vector, c2: Vector, right: Vector): Vector {
  const determinant = cross(c1, c2);
  return [cross(right, c2).div(determinant), cross(c1, right).div(determinant)];
}

interface PointBody {
  m: number;
  I: number;
  x: number;
  y: number;
}

function contact(A: PointBody, B: PointBody, px: number, py: number, plane: number) {
  const along: Vector = [precise(plane).cos(), precise(plane).sin()];
  const apart = minus(vector(B.x, B.y), vector(A.x, A.y));
  const first: Vector = [along[1], along[0].neg()];
  const n = dot(first, apart).isNegative() ? times(first, new Precise(-1)) : first;
  const [dA, dB] = [A, B].map((b) => minus(vector(px, py), vector(b.x, b.y)));
  /** Change of u per unit of impulse on B. */
  const response = (J: Vector): Vector => {
    const part = (b: PointBody, d: Vector): Vector =>
      plus(times(J, precise(b.m).pow(-1)), times(perp(d), cross(d, J).div(precise(b.I))));
    return plus(part(A, dA), part(B, dB));
  };
  return { n, t: perp(n), dA, dB, response };
}

const pointVelocity = (v: Vector, w: Decimal, d: Vector): Vector => plus(v, times(perp(d), w));

/** Forward, along the impulse: slides, then sticks or slides back, each leg as the linear equations that end it. */
export function preciseImpact({ A, B, px, py, plane, e, f }: ImpactBefore): Figures {
  const { n, t, dA, dB, response } = contact(A, B, px, py, plane);
  const u = minus(
    pointVelocity(vector(A.vx, A.vy), precise(A.w), dA),
    pointVelocity(vector(B.vx, B.vy), precise(B.w), dB),
  );
  const target = dot(u, n).times(precise(e)).neg();
  const friction = precise(f);
  const pull = dot(response(n), t); // slip that a normal impulse makes
  const holds = pull.abs().lte(friction.times(dot(response(t), t)));
  const slip = dot(u, t);
  const way = slip.isZero() ? (pull.isNegative() ? 1 : -1) : slip.isNegative() ? -1 : 1;

  /** From impulse J on along direction n + s f t until the normal velocity is the target. */
  const slideOn = (J: Vector, s: number): Vector => {
    const direction = plus(n, times(t, friction.times(s)));
    const rate = dot(response(direction), n);
    return plus(
      J,
      times(
        direction,
        dot(minus(u, response(J)), n)
          .minus(target)
          .div(rate),
      ),
    );
  };
  const stick = (): Vector => {
    const [rn, rt] = [response(n), response(t)];
    const [Jn, Jt] = solveTwo([dot(rn, n), dot(rn, t)], [dot(rt, n), dot(rt, t)], [dot(u, n).minus(target), slip]);
    return plus(times(n, Jn), times(t, Jt));
  };

  const start: Vector = [ZERO, ZERO];
  const sliding = plus(n, times(t, friction.times(way)));
  const stop = slip.div(dot(response(sliding), t)); // normal impulse at which the slip ends
  const ends = dot(response(sliding), n).gt(0) ? dot(slideOn(start, way), n) : new Precise(Infinity);
  let J: Vector;
  if (slip.isZero()) J = holds ? stick() : slideOn(start, way);
  else if (!(stop.gt(0) && stop.lt(ends))) J = slideOn(start, way);
  else J = holds ? stick() : slideOn(times(sliding, stop), pull.isNegative() ? 1 : -1);

  const after = minus(u, response(J));
  return {
    Jn: dot(J, n),
    Jt: dot(J, t),
    un: dot(u, n),
    ut: slip,
    utAfter: dot(after, t),
    'A.vx': precise(A.vx).minus(J[0].div(precise(A.m))),
    'A.vy': precise(A.vy).minus(J[1].div(precise(A.m))),
    'A.w': precise(A.w).minus(cross(dA, J).div(precise(A.I))),
    'B.vx': precise(B.vx).plus(J[0].div(precise(B.m))),
    'B.vy': precise(B.vy).plus(J[1].div(precise(B.m))),
    'B.w': precise(B.w).plus(cross(dB, J).div(precise(B.I))),
    energyLost: dot(J, plus(u, after)).div(2),
  };
}

/** Backward by directions, yaw rates after contact as measured. */
export function preciseDirections({ A, B, px, py, plane }: ImpactState): Figures {
  const { n, t, dA, dB } = contact(A, B, px, py, plane);
  const [vA, vB] = [vector(A.vx, A.vy), vector(B.vx, B.vy)];
  const momentum = plus(times(vA, precise(A.m)), times(vB, precise(B.m)));
  const [hA, hB] = [vector(A.hx, A.hy), vector(B.hx, B.hy)];
  const [sA, sB] = solveTwo(times(hA, precise(A.m)), times(hB, precise(B.m)), momentum);
  const J = times(minus(vB, times(hB, sB)), precise(B.m));
  const u = minus(
    pointVelocity(times(hA, sA), precise(A.wBefore), dA),
    pointVelocity(times(hB, sB), precise(B.wBefore), dB),
  );
  const after = minus(pointVelocity(vA, precise(A.wMeasured), dA), pointVelocity(vB, precise(B.wMeasured), dB));
  return {
    'A.speed': sA,
    'B.speed': sB,
    Jn: dot(J, n),
    Jt: dot(J, t),
    un: dot(u, n),
    ut: dot(u, t),
    e: dot(after, n).div(dot(u, n)).neg(),
    energyLost: dot(J, plus(u, after)).div(2),
    'A.wPredicted': precise(A.wBefore).minus(cross(dA, J).div(precise(A.I))),
    'B.wPredicted': precise(B.wBefore).plus(cross(dB, J).div(precise(B.I))),
  };
}

/** Backward by restitution: the unknown impulse from the normal velocity that it must have taken away. */
export function preciseRestitution({ A, B, px, py, plane, e, mu }: ImpactState): Figures {
  const { n, t, dA, dB, response } = contact(A, B, px, py, plane);
  const [vA, vB] = [vector(A.vx, A.vy), vector(B.vx, B.vy)];
  const after = minus(pointVelocity(vA, precise(A.wMeasured), dA), pointVelocity(vB, precise(B.wMeasured), dB));
  const un = dot(after, n).div(precise(e)).neg();
  const direction = plus(n, times(t, precise(mu)));
  const Jn = un.minus(dot(after, n)).div(dot(response(direction), n));
  const J = times(direction, Jn);
  const [beforeA, beforeB] = [plus(vA, times(J, precise(A.m).pow(-1))), minus(vB, times(J, precise(B.m).pow(-1)))];
  const u = plus(after, response(J));
  return {
    'A.vx': beforeA[0],
    'A.vy': beforeA[1],
    'B.vx': beforeB[0],
    'B.vy': beforeB[1],
    'A.wBefore': precise(A.wMeasured).plus(cross(dA, J).div(precise(A.I))),
    'B.wBefore': precise(B.wMeasured).minus(cross(dB, J).div(precise(B.I))),
    Jn,
    un,
    ut: dot(u, t),
    energyLost: dot(J, plus(u, after)).div(2),
  };
}
