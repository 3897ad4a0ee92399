import type { SpinSlots, VehicleSlots } from '@/lib/evidence/problem';
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
  const { departure, wheelbase, track } = slots;
  const frontAxleToMassCentre = inputs[slots.frontAxleToMassCentre][k];
  const dimensions = { m: body.m, wheelbase, track, frontAxleToMassCentre };
  const on = (settings: { braking: number; steer: number }[], ground: Ground, onset: number): TyreMotion =>
    new TyreMotion({ m: body.m, I: body.I, wheels: fourWheels(dimensions, settings) }, ground, onset);
  if (departure.kind === 'spin') {
    const onset = departure.onset === null ? 0 : inputs[departure.onset][k];
    return on(ownWheels(inputs, k, departure), groundOf(inputs, k, departure), Math.max(0, onset - elapsed));
  }
  const { friction, share } = departure.kind === 'legs' ? departure.legs[0] : departure;
  const wheel = { braking: inputs[share][k], steer: 0 };
  return on([wheel, wheel, wheel, wheel], levelGround(inputs[friction][k]), 0);
}

function ownWheels(inputs: Inputs, k: number, { braking, steer }: SpinSlots) {
  const at = (slot: number | null): number => (slot === null ? 0 : inputs[slot][k]);
  return braking.map((slot, i) => ({ braking: at(slot), steer: at(steer[i]) }));
}

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
