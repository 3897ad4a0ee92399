import { tyreShareOf } from '@/lib/evidence/tyre-share';
import { VEHICLE_IDS, type VehicleId } from '@/lib/casefile/schema';
import { atan2, hypot } from '@/lib/numerics/elementary';
import { PAIR } from '@/lib/mechanics/pair-motion';
import { peakAcceleration } from '@/lib/mechanics/pulse';
import type { Solution } from '@/lib/solve/solution';
import type { Result } from './result';

const DEGREES_PER_RADIAN = 180 / Math.PI;

/** Further figures of the central solution, as resultSchema names them; what is not finite is left out. */
export function moreOf(solution: Solution): Result['more'] {
  const { problem, central } = solution;
  const { state, answer, figures } = central;
  const { A, B } = state;
  const peak = (meanOf: number | undefined): number | undefined =>
    meanOf === undefined ? undefined : peakAcceleration(meanOf);
  const more: Result['more'] = {
    ...(problem.method === 'directions'
      ? { condition: answer.condition, sinBetween: answer.sinBetween }
      : { amplification: 1 / state.e }),
    closingEnergy: answer.closingEnergy,
    shareLost: answer.energyLost / answer.closingEnergy,
    'A.peakAcceleration': peak(figures['A.meanAcceleration']),
    'B.peakAcceleration': peak(figures['B.meanAcceleration']),
    'A.yawInertia': A.I,
    'B.yawInertia': B.I,
    'A.predictedYawRate': answer.A.wPredicted * DEGREES_PER_RADIAN,
    'B.predictedYawRate': answer.B.wPredicted * DEGREES_PER_RADIAN,
    momentumBefore: [A.m * answer.A.vx + B.m * answer.B.vx, A.m * answer.A.vy + B.m * answer.B.vy],
    momentumAfter: [A.m * A.vx + B.m * B.vx, A.m * A.vy + B.m * B.vy],
    angularMomentumBefore: angularMomentum(solution, 'before'),
    angularMomentumAfter: angularMomentum(solution, 'after'),
    tyreShare: tyreShareOf(problem, figures.impulse) ?? undefined,
    ...lastingFigures(solution),
  };
  const finite = Object.entries(more).filter(([, value]) =>
    [value].flat().every((x) => typeof x === 'number' && Number.isFinite(x)),
  );
  return { ...Object.fromEntries(finite), ...separationsOf(solution) };
}

/** What a contact that lasts was like. */
function lastingFigures({ problem, central: { contact, state, figures } }: Solution): Result['more'] {
  if (!contact) return {};
  const { y, duration, penetration, slide } = contact;
  const of = (id: VehicleId, at: number): [string, number | [number, number]][] => {
    const tyres = hypot(y[at], y[at + 1]);
    const { roadX, roadY, roadW } = state[id];
    return [
      [`${id}.tyreImpulse`, tyres],
      [`${id}.tyreShare`, tyres / figures.impulse],
      ...(problem.fit ? [] : [[`${id}.roadImpulse`, [roadX, roadY]] as [string, [number, number]]]),
      ...(problem.fit ? [] : [[`${id}.roadYawRate`, roadW * DEGREES_PER_RADIAN] as [string, number]]),
    ];
  };
  return {
    contactDuration: duration,
    penetration,
    slide,
    ...Object.fromEntries([...of('A', PAIR.tyresA), ...of('B', PAIR.tyresB)]),
  };
}

/** Every separation that leads to a measured rest pose, that answered first. */
function separationsOf({ central: { spins } }: Solution): Result['more'] {
  const all = VEHICLE_IDS.flatMap((id) => {
    const found = spins[id];
    if (!found) return [];
    const listed = [found.separations, found.otherTurns].flatMap((inversions, k) =>
      inversions.map(({ separation: { vx, vy, w } }) => ({
        speed: hypot(vx, vy),
        direction: atan2(vy, vx) * DEGREES_PER_RADIAN,
        yawRate: w * DEGREES_PER_RADIAN,
        otherTurn: k === 1,
      })),
    );
    return [[`${id}.separations`, listed] as const];
  });
  return Object.fromEntries(all);
}

/** About the contact point, kg m^2/s; after contact with the yaw rates that the impulse predicts. */
function angularMomentum({ central: { state, answer } }: Solution, when: 'before' | 'after'): number {
  return (['A', 'B'] as const).reduce((sum, id) => {
    const body = state[id];
    const found = answer[id];
    const [vx, vy, w] = when === 'before' ? [found.vx, found.vy, found.wBefore] : [body.vx, body.vy, found.wPredicted];
    const [rx, ry] = [body.x - state.px, body.y - state.py];
    return sum + body.I * w + body.m * (rx * vy - ry * vx);
  }, 0);
}
