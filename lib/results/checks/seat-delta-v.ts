import { VEHICLE_IDS } from '@/lib/casefile/schema';
import { hypot } from '@/lib/numerics/elementary';
import { seatDeltaV } from '@/lib/mechanics/seat';
import type { CheckRule } from './check';
import { spoken } from './words';

const SHARE = 0.1;
/** m/s: 1 km/h. */
const MOST = 1 / 3.6;

export const seatDeltaVDiffers: CheckRule = {
  id: 'seatDeltaV',
  source: 'screening value: 10 % of the delta-V of the vehicle, or 1 km/h, whichever is less',
  find({ casefile, solution: { problem, central } }) {
    const { figures } = central;
    const seats = VEHICLE_IDS.flatMap((id) =>
      problem.seats[id].map((seat) => {
        const vehicle = figures[`${id}.deltaV`];
        const at = seatDeltaV(
          figures[`${id}.deltaVForward`],
          figures[`${id}.deltaVLeft`],
          figures[`${id}.yawRateChange`],
          seat,
        );
        const size = hypot(at.forward, at.left);
        return {
          id,
          name: seat.name,
          size,
          vehicle,
          off: Math.abs(size - vehicle),
          limit: Math.min(SHARE * vehicle, MOST),
        };
      }),
    ).filter(({ off, limit }) => Number.isFinite(off) && limit > 0);
    const worst = seats.sort((p, q) => q.off / q.limit - p.off / p.limit)[0];
    if (!worst) return null;
    const { id, name, size, vehicle, off, limit } = worst;
    const differs = off > limit;
    return {
      level: differs ? 'note' : 'pass',
      value: off,
      limit,
      says: `Delta-V at the seat «${name}» of ${id} is ${spoken(casefile, size, 'speed', 1)}, at the mass centre ${spoken(casefile, vehicle, 'speed', 1)}.`,
      advice: differs ? 'State both: the rotation gives each seat a speed change of its own.' : undefined,
      paths: [`vehicles.${id}.seats`],
    };
  },
};
