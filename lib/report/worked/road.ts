import type { VehicleId } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import { figure, pair } from './figure';
import type { Sheet } from './sheet';
import { type Vector, radians } from './vector';

/** What the road gave each vehicle while the contact lasted: impulse, N s, and change of the yaw rate, rad/s. */
export type RoadGiven = Record<VehicleId, { impulse: Vector; yawRate: number }>;

/** As the engine's fixed point found it; null for an instant. Its steps cannot be written out by hand. */
export function roadGiven({ more }: Result): RoadGiven | null {
  const of = (id: VehicleId) => {
    const [impulse, rate] = [more[`${id}.roadImpulse`], more[`${id}.roadYawRate`]];
    return impulse && rate !== undefined ? { impulse: { x: impulse[0], y: impulse[1] }, yawRate: radians(rate) } : null;
  };
  const [A, B] = [of('A'), of('B')];
  return A && B ? { A, B } : null;
}

/** The lines that say what is taken as given. */
export function roadLines(road: RoadGiven, sheet: Sheet): void {
  sheet.begin('What the tyres gave while the contact lasted, taken as given');
  for (const id of ['A', 'B'] as const) {
    const { impulse, yawRate } = road[id];
    sheet.line(`Impulse of the road on ${id}`, `!T_{${id}}`, pair(impulse), `!T_{${id}} = ${pair(impulse)} "N s"`);
    sheet.line(
      `Change of the yaw rate of ${id} by the road`,
      `τ_{${id}}`,
      figure(yawRate),
      `τ_{${id}} = ${figure(yawRate)} "rad/s"`,
    );
  }
}
