import { DEFAULT_SOURCE, drawnQuantity } from '@/lib/casefile/defaults';
import type { Edit } from '@/lib/casefile/edit';
import type { CaseFile, FourWheels, Quantity, VehicleId } from '@/lib/casefile/schema';
import { WHEELS, type WheelId, wheelsApart, wheelsTogether } from '@/lib/casefile/wheels';
import { type Vec, angleOf, subtract, toDegrees } from '@/lib/geometry/vector';
import { type Scene, wheelPlaces } from '@/lib/scene/scene';
import type { NamedEdit } from './named-edit';
import { tenths, wrapped } from './turn';

/** Standard uncertainty that a steer angle set by hand gets, deg: a screening value, to be replaced by what was measured. */
const DRAWN_STEER = 2;
/** Steer turned by one step of the arrow keys, deg for each m of that step. */
const STEER_PER_METRE = 10;
/** Degrees that a turn clings to while Shift is held. */
const COARSE = 5;

/** The four wheels of a vehicle, where they are set one by one. */
function wheelsOf({ departure }: CaseFile, which: VehicleId): FourWheels | null {
  const travel = departure[which];
  return travel?.kind === 'spin' && !('all' in travel.wheels) ? travel.wheels : null;
}

/** One braking for all becomes four wheels to be set. */
export function wheelsSetApart({ departure }: CaseFile, which: VehicleId): NamedEdit | null {
  const travel = departure[which];
  if (travel?.kind !== 'spin' || !('all' in travel.wheels)) return null;
  const to = wheelsApart(travel.wheels);
  return { label: `set each wheel of ${which}`, edit: { do: 'set', path: `departure.${which}.wheels`, to } };
}

/** Four wheels that brake alike and are not steered become one braking for all. */
export function wheelsSetTogether(casefile: CaseFile, which: VehicleId): NamedEdit | null {
  const wheels = wheelsOf(casefile, which);
  const to = wheels && wheelsTogether(wheels);
  if (!to) return null;
  return {
    label: `one braking for all wheels of ${which}`,
    edit: { do: 'set', path: `departure.${which}.wheels`, to },
  };
}

/** A steer angle set by hand is not known exactly: one that nobody had touched gets the uncertainty of a drawing. */
function steerEdit(path: string, steer: Quantity, to: number): Edit {
  const untouched = steer.source === DEFAULT_SOURCE && (!steer.spread || steer.spread.shape === 'fixed');
  return untouched && to !== steer.value
    ? { do: 'set', path, to: drawnQuantity(to, DRAWN_STEER) }
    : { do: 'value', path, value: to };
}

/** The wheel points to a place in the world. */
export function steerDrag(
  casefile: CaseFile,
  scene: Scene,
  which: VehicleId,
  index: number,
  to: Vec,
  coarse: boolean,
): Edit {
  const wheels = wheelsOf(casefile, which);
  if (!wheels) return { do: 'all', edits: [] };
  const { id } = WHEELS[index];
  const centre = wheelPlaces(scene.vehicles[which])[index];
  const exact = toDegrees(angleOf(subtract(to, centre))) - casefile.impact[which].heading.value;
  const steer = wrapped(coarse ? Math.round(exact / COARSE) * COARSE : exact);
  return steerEdit(`departure.${which}.wheels.${id}.steer`, wheels[id].steer, tenths(steer));
}

/** Left and right steer the wheel, up and down brake it more and less; a turn steers it too. */
export function wheelNudge(casefile: CaseFile, which: VehicleId, wheel: WheelId, step: Vec, turn: number): Edit[] {
  const set = wheelsOf(casefile, which)?.[wheel];
  if (!set) return [];
  const at = `departure.${which}.wheels.${wheel}`;
  const { braking, steer } = set;
  const by = turn - step[0] * STEER_PER_METRE;
  const share = Math.min(1, Math.max(0, Number((braking.value + step[1]).toFixed(4))));
  return [
    ...(by === 0 ? [] : [steerEdit(`${at}.steer`, steer, wrapped(Number((steer.value + by).toFixed(3))))]),
    ...(step[1] === 0 ? [] : [{ do: 'value', path: `${at}.braking`, value: share } as const]),
  ];
}
