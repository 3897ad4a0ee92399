import type { ImpactAfter, ImpactBefore } from '@/lib/mechanics/impact';
import {
  type ImpactAnswer,
  type ImpactState,
  emptyAnswer,
  solveDirections,
  solveRestitution,
} from '@/lib/mechanics/impact-backwards';
import type { Reason } from '@/lib/mechanics/reasons';

/** What an engineer would find after an impact: separation as it was, approach directions as they were. */
export function evidenceOf(before: ImpactBefore, after: ImpactAfter): ImpactState {
  const vehicle = (id: 'A' | 'B') => {
    const { m, I, x, y, vx, vy, w } = before[id];
    const speed = Math.hypot(vx, vy);
    const found = after[id];
    const road = { roadX: 0, roadY: 0, roadW: 0 };
    return {
      m,
      I,
      x,
      y,
      vx: found.vx,
      vy: found.vy,
      wBefore: w,
      wMeasured: found.w,
      hx: vx / speed,
      hy: vy / speed,
      ...road,
    };
  };
  const { px, py, plane, e } = before;
  return { A: vehicle('A'), B: vehicle('B'), px, py, plane, e, mu: after.Jt / after.Jn };
}

export interface Backward {
  answer: ImpactAnswer;
  reason: Reason | null;
}

export function byDirections(state: ImpactState): Backward {
  const answer = emptyAnswer();
  return { reason: solveDirections(state, answer), answer };
}

export function byRestitution(state: ImpactState): Backward {
  const answer = emptyAnswer();
  return { reason: solveRestitution(state, answer), answer };
}

/** The sine of the angle between the approaches: near 0 the method directions has nothing to stand on. */
export const sinBetween = ({ A, B }: ImpactState): number => A.hx * B.hy - A.hy * B.hx;
