import type { VehicleId } from '@/lib/casefile/schema';
import { travelToRest } from '@/lib/mechanics/spin';
import { hypot } from '@/lib/numerics/elementary';
import type { Central } from './central';
import { Kernel } from './kernel';
import { targetOf } from './spin-travel';

/** Position error, m, that the simulation aims at. */
const ERROR = 1e-4;

/** Length of the path of the mass centre and the straight way from its first point to its last, m. */
export interface PathLength {
  path: number;
  chord: number;
}

/** How far the mass centre of a vehicle runs from contact to rest in the central answer; null where nothing is simulated. */
export function pathLengthOf({ problem, spins, state }: Central, id: VehicleId): PathLength | null {
  const best = spins[id]?.separations[0];
  const { departure } = problem.vehicles[id];
  if (!best || departure.kind !== 'spin') return null;
  const { motion, from } = targetOf(new Kernel(problem).inputs, 0, problem.vehicles[id], departure, state[id], ERROR);
  const { vx, vy, w } = best.separation;
  let [path, x, y] = [0, from.x, from.y];
  const rest = travelToRest(motion, [x, y, from.heading, vx, vy, w], ERROR, (_, at) => {
    path += hypot(at[0] - x, at[1] - y);
    [x, y] = [at[0], at[1]];
  });
  return { path, chord: hypot(rest.x - from.x, rest.y - from.y) };
}
