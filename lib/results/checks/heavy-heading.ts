import type { Quantity, VehicleId } from '@/lib/casefile/schema';
import { type CheckContext, type CheckRule } from './check';
import { combined } from './drawn';
import { spoken } from './words';

const RATIO = 3;
/** Degrees. */
const UNCERTAIN = 1;
const RADIANS_PER_DEGREE = Math.PI / 180;

/** The larger standard uncertainty, deg, of where a vehicle came from and where it went, and the path of that one. */
function uncertainty({ casefile, bands }: CheckContext, id: VehicleId): { path: string; sd: number } {
  const spreadOf = (quantity: Quantity | null | undefined): number => (quantity ? combined(quantity) : 0);
  const departure = casefile.departure[id];
  const before = { path: `approach.${id}.direction`, sd: spreadOf(casefile.approach[id].direction) };
  const after =
    departure?.kind === 'legs'
      ? { path: `departure.${id}.direction`, sd: spreadOf(departure.direction) }
      : { path: `departure.${id}.rest.x`, sd: bands[`${id}.departureDirection`]?.sd ?? 0 };
  return after.sd > before.sd ? after : before;
}

export const heavyHeading: CheckRule = {
  id: 'heavyHeading',
  source: 'screening value: momentum ratio above 3 with a direction uncertain by more than 1 deg',
  find(context) {
    const { solution, casefile } = context;
    if (solution.problem.method !== 'directions') return null;
    const { state, answer } = solution.central;
    const momentum = { A: state.A.m * Math.abs(answer.A.speed), B: state.B.m * Math.abs(answer.B.speed) };
    const [heavy, light]: VehicleId[] = momentum.A >= momentum.B ? ['A', 'B'] : ['B', 'A'];
    const value = momentum[heavy] / momentum[light];
    const { path, sd } = uncertainty(context, heavy);
    const bad = value > RATIO && sd > UNCERTAIN;
    const carried = value > 100 ? 'more than 100 times' : `${value.toFixed(1)} times`;
    const moved = (momentum[heavy] * RADIANS_PER_DEGREE) / (state[light].m * Math.abs(answer.sinBetween));
    return {
      level: bad ? 'caution' : 'pass',
      value,
      limit: RATIO,
      says: `Vehicle ${heavy} carries ${carried} the momentum of ${light} before contact and its direction is known to ${sd.toFixed(1)}°: each degree moves the speed of ${light} by ${spoken(casefile, moved, 'speed', 1)}.`,
      advice: bad
        ? `Measure the directions of ${heavy} again before anything else: the speed of ${light} hangs on them.`
        : undefined,
      paths: [path],
    };
  },
};
