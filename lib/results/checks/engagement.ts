import { type VehicleId, VEHICLE_IDS } from '@/lib/casefile/schema';
import { cross } from '@/lib/mechanics/contact-frame';
import { hypot } from '@/lib/numerics/elementary';
import type { CheckContext, CheckRule } from './check';
import { outlineAtContact } from './drawn';
import { percent } from './words';

const OVERLAP = 0.5;
const GAMMA = 0.9;

/** From where to where an outline reaches along the contact plane, m. */
function reachOf(context: CheckContext, id: VehicleId): [number, number] {
  const { nx, ny } = context.solution.central.answer.frame;
  const along = outlineAtContact(context, id).map(([x, y]) => y * nx - x * ny);
  return [Math.min(...along), Math.max(...along)];
}

/** Common length of both outlines along the contact plane over the shorter of the two. */
function overlapAlongPlane(context: CheckContext): number {
  const [A, B] = [reachOf(context, 'A'), reachOf(context, 'B')];
  const common = Math.min(A[1], B[1]) - Math.max(A[0], B[0]);
  return Math.max(0, common) / Math.min(A[1] - A[0], B[1] - B[0]);
}

/** k^2 / (k^2 + h^2), with the radius of gyration k and the lever arm h of the impulse: 1 where the impulse passes through the mass centre. */
function gammaOf({ solution: { central } }: CheckContext, id: VehicleId): number {
  const { Jn, Jt, frame } = central.answer;
  const [dx, dy] = id === 'A' ? [frame.dAx, frame.dAy] : [frame.dBx, frame.dBy];
  const [Jx, Jy] = [Jn * frame.nx - Jt * frame.ny, Jn * frame.ny + Jt * frame.nx];
  const h = cross(dx, dy, Jx, Jy) / hypot(Jx, Jy);
  const square = central.state[id].I / central.state[id].m;
  return square / (square + h * h);
}

export const engagement: CheckRule = {
  id: 'engagement',
  source: 'screening value: overlap below 50 % (unequal strokes, SAE 940916), or k^2/(k^2 + h^2) below 0.9',
  find(context) {
    const overlap = overlapAlongPlane(context);
    const arms = VEHICLE_IDS.map((id) => ({ id, gamma: gammaOf(context, id) }));
    const { id, gamma } = arms.sort((p, q) => p.gamma - q.gamma)[0];
    if (!Number.isFinite(overlap + gamma)) return null;
    const partial = overlap < OVERLAP;
    const speaks = partial || gamma < GAMMA;
    return {
      level: speaks ? 'note' : 'pass',
      value: partial ? overlap : gamma,
      limit: partial ? OVERLAP : GAMMA,
      says: `Along the contact plane the outlines overlap over ${percent(overlap)} of the narrower; the lever arm leaves ${percent(gamma)} of the mass of ${id} at work at the contact.${speaks ? ' The planar impact takes the lever arm into account, an impact in line would not.' : ''}`,
      advice: speaks
        ? 'Do not compare with figures for full engagement; look for unequal strokes left and right.'
        : undefined,
      paths: ['impact.point.x', 'impact.point.y', 'impact.plane'],
    };
  },
};
