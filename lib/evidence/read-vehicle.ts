import { supportOf } from '@/lib/casefile/quantities';
import type {
  CaseFile,
  Damage,
  FourWheels,
  LegsDeparture,
  Method,
  Quantity,
  SpinDeparture,
  VehicleId,
} from '@/lib/casefile/schema';
import { YAW_INERTIA_RELATIVE_SD } from '@/lib/mechanics/inertia';
import { type InputList, inputOf } from './input-list';
import type { DamageSlots, Input, LegsSlots, ObservedSlots, SpinSlots, VehicleSlots } from './problem';

/** What the method uses of one vehicle: itself, its pose, its approach, its travel and its damage. */
export function readVehicle(list: InputList, casefile: CaseFile, method: Method, id: VehicleId): VehicleSlots {
  const spec = casefile.vehicles[id];
  const approach = casefile.approach[id];
  const pose = casefile.impact[id];
  const crossing = method === 'directions';
  return {
    mass: list.si(`vehicles.${id}.mass`, spec.mass),
    yawInertia: spec.yawInertia
      ? list.si(`vehicles.${id}.yawInertia`, spec.yawInertia)
      : list.add(estimateFactor(`vehicles.${id}.yawInertia`)),
    inertiaEstimated: !spec.yawInertia,
    frontAxleToMassCentre: list.add(massCentre(`vehicles.${id}.frontAxleToMassCentre`, spec)),
    wheelbase: spec.wheelbase,
    track: spec.track,
    x: list.si(`impact.${id}.x`, pose.x),
    y: list.si(`impact.${id}.y`, pose.y),
    heading: list.angle(`impact.${id}.heading`, pose.heading),
    approachDirection: crossing ? list.angleIf(`approach.${id}.direction`, approach.direction) : null,
    approachYawRate: method !== 'restitution' ? list.angle(`approach.${id}.yawRate`, approach.yawRate) : null,
    departure: readDeparture(list, casefile, method, id),
    damage: method === 'fit' ? null : readDamage(list, casefile.damage?.[id], `damage.${id}`),
  };
}

/** An estimated yaw inertia is the rule times a factor about 1, whose spread is that of the rule. */
const estimateFactor = (path: string): Input => ({
  path,
  value: 1,
  spread: { shape: 'normal', sd: YAW_INERTIA_RELATIVE_SD },
  support: supportOf(path),
});

/** The mass centre lies between the axles. */
function massCentre(path: string, spec: CaseFile['vehicles']['A']): Input {
  const input = inputOf(path, spec.frontAxleToMassCentre, 1);
  return { ...input, support: { ...input.support, high: spec.wheelbase } };
}

function readDeparture(
  list: InputList,
  casefile: CaseFile,
  method: Method,
  id: VehicleId,
): LegsSlots | SpinSlots | ObservedSlots {
  const departure = casefile.departure[id];
  if (departure?.kind === 'spin') return readSpin(list, casefile, departure, id, method !== 'fit');
  if (method === 'fit') return readObserved(list, departure ?? null, id);
  return readLegs(list, departure as LegsDeparture, `departure.${id}`);
}

/** Friction and share of a vehicle whose travel left no evidence: it rolls freely (contract of the model). */
const UNKNOWN_TRAVEL = { friction: 0.7, share: 0 };

/** The wheels of a vehicle in a fit while a contact lasts: those of its first leg, at their values. */
function readObserved(list: InputList, departure: LegsDeparture | null, id: VehicleId): ObservedSlots {
  const [leg] = departure?.legs ?? [];
  const at = `departure.${id}.legs.0`;
  const fixed = (key: 'friction' | 'share') =>
    list.si(`${at}.${key}`, { value: leg?.[key].value ?? UNKNOWN_TRAVEL[key] });
  return { kind: 'observed', friction: fixed('friction'), share: fixed('share') };
}

const WHEELS = ['frontLeft', 'frontRight', 'rearLeft', 'rearRight'] as const;

function readSpin(
  list: InputList,
  casefile: CaseFile,
  spin: SpinDeparture,
  id: VehicleId,
  backwards: boolean,
): SpinSlots {
  const at = `departure.${id}`;
  const { rest, wheels } = spin;
  const all = 'all' in wheels ? list.si(`${at}.wheels.all.braking`, wheels.all.braking) : null;
  const each = 'all' in wheels ? null : wheels;
  return {
    kind: 'spin',
    rest: backwards
      ? {
          x: list.si(`${at}.rest.x`, rest.x as Quantity),
          y: list.si(`${at}.rest.y`, rest.y as Quantity),
          heading: list.angle(`${at}.rest.heading`, rest.heading as Quantity),
        }
      : null,
    friction: list.si(`${at}.friction`, spin.friction),
    onset: list.siIf(`${at}.onset`, spin.onset),
    grade: list.siIf(`${at}.slope.grade`, spin.slope?.grade),
    uphill: list.angleIf(`${at}.slope.uphill`, spin.slope?.uphill),
    braking: WHEELS.map((w) => all ?? list.si(`${at}.wheels.${w}.braking`, (each as FourWheels)[w].braking)),
    steer: WHEELS.map((w) => (each ? list.angle(`${at}.wheels.${w}.steer`, each[w].steer) : null)),
    surfaces: (casefile.scene?.surfaces ?? []).map(({ outline, friction }, k) => ({
      outline,
      friction: list.shared(`scene.surfaces.${k}.friction`, friction),
    })),
    start: null,
  };
}

export const readLegs = (
  list: InputList,
  { direction, yawRate, endSpeed, legs }: LegsDeparture,
  at: string,
): LegsSlots => ({
  kind: 'legs',
  direction: list.angle(`${at}.direction`, direction),
  yawRate: list.angleIf(`${at}.yawRate`, yawRate),
  endSpeed: list.si(`${at}.endSpeed`, endSpeed),
  legs: legs.map((leg, k) => ({
    distance: list.si(`${at}.legs.${k}.distance`, leg.distance),
    friction: list.si(`${at}.legs.${k}.friction`, leg.friction),
    share: list.si(`${at}.legs.${k}.share`, leg.share),
    grade: list.si(`${at}.legs.${k}.grade`, leg.grade),
  })),
});

/** No residual depth at all bounds the energy from above and gives no estimate: null, unless the bound is asked for. */
export function readDamage(
  list: InputList,
  damage: Damage | null | undefined,
  at: string,
  asBound = false,
): DamageSlots | null {
  if (!damage || (!asBound && damage.depths.every(({ value }) => value === 0))) return null;
  return {
    depths: damage.depths.map((depth, i) => list.si(`${at}.depths.${i}`, depth)),
    strips: stripShares(damage),
    width: list.si(`${at}.width`, damage.width),
    forceAngle: list.angle(`${at}.forceAngle`, damage.forceAngle),
    a: list.si(`${at}.a`, damage.a),
    b: list.si(`${at}.b`, damage.b),
  };
}

/** Stations left out are equally spaced, ends included; stated ones scale with the width. */
function stripShares({ depths, stations, width }: Damage): number[] {
  const n = depths.length - 1;
  if (!stations) return Array.from({ length: n }, () => 1 / n);
  return stations.slice(1).map((station, i) => (station - stations[i]) / width.value);
}
