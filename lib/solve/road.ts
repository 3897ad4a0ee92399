import type { LegsSlots, SpinSlots, VehicleSlots } from '@/lib/evidence/problem';
import { holds } from '@/lib/geometry/polygon';
import type { VehicleState } from '@/lib/mechanics/impact-backwards';
import { type Ground, TyreMotion, fourWheels } from '@/lib/mechanics/spin';

type Inputs = readonly Float64Array[];

/**
 * A vehicle under its tyres as drawn. Simulated travel has its own wheels and ground; legs give all wheels the friction and
 * the retardation share of the first leg, steer 0, from first touch. `elapsed` is the time since first touch, s.
 */
export function roadUnder(
  inputs: Inputs,
  k: number,
  slots: VehicleSlots,
  body: VehicleState,
  elapsed: number,
): TyreMotion {
  const { departure } = slots;
  const at = (slot: number | null): number => (slot === null ? 0 : inputs[slot][k]);
  const simulated = departure.kind === 'spin';
  const wheels = fourWheels(
    {
      m: body.m,
      wheelbase: slots.wheelbase,
      track: slots.track,
      frontAxleToMassCentre: at(slots.frontAxleToMassCentre),
    },
    simulated ? ownWheels(at, departure) : firstLegWheels(at, departure),
  );
  const ground = simulated ? groundOf(inputs, k, departure) : levelGround(at(departure.legs[0].friction));
  const onset = simulated ? Math.max(0, at(departure.onset) - elapsed) : 0;
  return new TyreMotion({ m: body.m, I: body.I, wheels }, ground, onset);
}

type At = (slot: number | null) => number;

const ownWheels = (at: At, { braking, steer }: SpinSlots) =>
  braking.map((slot, i) => ({ braking: at(slot), steer: at(steer[i]) }));

const firstLegWheels = (at: At, { legs }: LegsSlots) =>
  [0, 1, 2, 3].map(() => ({ braking: at(legs[0].share), steer: 0 }));

const levelGround = (friction: number): Ground => ({ friction, frictionAt: null, grade: 0, uphill: 0 });

const groundOf = (inputs: Inputs, k: number, spin: SpinSlots): Ground => ({
  friction: inputs[spin.friction][k],
  frictionAt: frictionAt(inputs, k, spin),
  grade: spin.grade === null ? 0 : inputs[spin.grade][k],
  uphill: spin.uphill === null ? 0 : inputs[spin.uphill][k],
});

/** Of overlapping surfaces the last listed counts. */
function frictionAt(inputs: Inputs, k: number, spin: SpinSlots): Ground['frictionAt'] {
  if (spin.surfaces.length === 0) return null;
  const elsewhere = inputs[spin.friction][k];
  return (x, y) => {
    const under = spin.surfaces.findLast(({ outline }) => holds(outline, [x, y]));
    return under ? inputs[under.friction][k] : elsewhere;
  };
}
