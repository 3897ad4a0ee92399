import type { Issue } from '@/lib/casefile/issue';
import { supportOf } from '@/lib/casefile/quantities';
import type { CaseFile, Damage, LegsDeparture, Method, Quantity, VehicleId } from '@/lib/casefile/schema';
import { YAW_INERTIA_RELATIVE_SD } from '@/lib/mechanics/inertia';
import type { DrawSpread } from '@/lib/numerics/spread';
import type { DamageSlots, Input, LegsSlots, Problem, Slot, SolvedMethod, VehicleSlots } from './problem';

const RADIANS_PER_DEGREE = Math.PI / 180;

/** What a case asks for that this version does not compute, as the reason of an unsolved case; null when it does. */
export function notYetSolved(casefile: CaseFile, method: Method): Issue | null {
  if (method === 'fit') return { path: 'analysis.method', says: 'this version does not solve the method fit yet' };
  if (casefile.analysis.contact === 'lasting')
    return { path: 'analysis.contact', says: 'this version does not solve the contact lasting yet: choose instant' };
  for (const id of ['A', 'B'] as const)
    if (casefile.departure[id]?.kind === 'spin')
      return { path: `departure.${id}.kind`, says: 'this version does not simulate travel to rest (spin) yet: enter the travel as legs' };
  return null;
}

/**
 * Turns a case into the problem that its method solves: the only place where degrees become radians. The case must
 * have passed needsOf and notYetSolved for the method.
 */
export function readEvidence(casefile: CaseFile, method: SolvedMethod, seed: number): Problem {
  const inputs: Input[] = [];
  const add = (input: Input): Slot => inputs.push(input) - 1;
  const si = (path: string, quantity: Quantity): Slot =>
    add({ path, value: quantity.value, spread: spreadOf(quantity, 1), support: supportOf(path) });
  const angle = (path: string, quantity: Quantity): Slot =>
    add({
      path,
      value: quantity.value * RADIANS_PER_DEGREE,
      spread: spreadOf(quantity, RADIANS_PER_DEGREE),
      support: supportOf(path),
    });

  const legs = (id: VehicleId): LegsSlots => {
    const departure = casefile.departure[id] as LegsDeparture;
    const at = `departure.${id}`;
    return {
      direction: angle(`${at}.direction`, departure.direction),
      yawRate: departure.yawRate ? angle(`${at}.yawRate`, departure.yawRate) : null,
      endSpeed: si(`${at}.endSpeed`, departure.endSpeed),
      legs: departure.legs.map((leg, k) => ({
        distance: si(`${at}.legs.${k}.distance`, leg.distance),
        friction: si(`${at}.legs.${k}.friction`, leg.friction),
        share: si(`${at}.legs.${k}.share`, leg.share),
        grade: si(`${at}.legs.${k}.grade`, leg.grade),
      })),
    };
  };

  const damage = (id: VehicleId): DamageSlots | null => {
    const stated = casefile.damage?.[id];
    if (!stated || stated.depths.every(({ value }) => value === 0)) return null;
    const at = `damage.${id}`;
    return {
      depths: stated.depths.map((depth, i) => si(`${at}.depths.${i}`, depth)),
      strips: stripShares(stated),
      width: si(`${at}.width`, stated.width),
      forceAngle: angle(`${at}.forceAngle`, stated.forceAngle),
      a: si(`${at}.a`, stated.a),
      b: si(`${at}.b`, stated.b),
    };
  };

  const vehicle = (id: VehicleId): VehicleSlots => {
    const spec = casefile.vehicles[id];
    const approach = casefile.approach[id];
    const pose = casefile.impact[id];
    const massCentre = `vehicles.${id}.frontAxleToMassCentre`;
    const inertia = `vehicles.${id}.yawInertia`;
    return {
      mass: si(`vehicles.${id}.mass`, spec.mass),
      yawInertia: spec.yawInertia ? si(inertia, spec.yawInertia) : add(estimateFactor(inertia)),
      inertiaEstimated: !spec.yawInertia,
      frontAxleToMassCentre: add({
        path: massCentre,
        value: spec.frontAxleToMassCentre.value,
        spread: spreadOf(spec.frontAxleToMassCentre, 1),
        support: { ...supportOf(massCentre), high: spec.wheelbase },
      }),
      wheelbase: spec.wheelbase,
      x: si(`impact.${id}.x`, pose.x),
      y: si(`impact.${id}.y`, pose.y),
      heading: angle(`impact.${id}.heading`, pose.heading),
      approachDirection:
        method === 'directions' && approach.direction ? angle(`approach.${id}.direction`, approach.direction) : null,
      approachYawRate: method === 'directions' ? angle(`approach.${id}.yawRate`, approach.yawRate) : null,
      departure: legs(id),
      damage: damage(id),
    };
  };

  const { impact } = casefile;
  const restitution = method === 'restitution' && impact.restitution ? si('impact.restitution', impact.restitution) : null;
  const impulseRatio = method === 'restitution' && impact.impulseRatio ? si('impact.impulseRatio', impact.impulseRatio) : null;
  const vehicles = { A: vehicle('A'), B: vehicle('B') };
  return {
    method,
    vehicles,
    pointX: si('impact.point.x', impact.point.x),
    pointY: si('impact.point.y', impact.point.y),
    plane: angle('impact.plane', impact.plane),
    restitution,
    impulseRatio,
    pulse: casefile.pulse ? si('pulse', casefile.pulse) : null,
    seats: { A: casefile.vehicles.A.seats ?? [], B: casefile.vehicles.B.seats ?? [] },
    seed,
    inputs,
  };
}

/** Stations left out are equally spaced, ends included; stated ones scale with the width. */
function stripShares({ depths, stations, width }: Damage): number[] {
  const n = depths.length - 1;
  if (!stations) return new Array<number>(n).fill(1 / n);
  return stations.slice(1).map((station, i) => (station - stations[i]) / width.value);
}

/** An estimated yaw inertia is the rule times a factor about 1, whose spread is that of the rule. */
const estimateFactor = (path: string): Input => ({
  path,
  value: 1,
  spread: { shape: 'normal', sd: YAW_INERTIA_RELATIVE_SD },
  support: supportOf(path),
});

function spreadOf({ spread }: Quantity, factor: number): DrawSpread {
  if (!spread || spread.shape === 'fixed') return { shape: 'fixed' };
  if (spread.shape === 'normal') return { shape: 'normal', sd: spread.sd * factor };
  return { shape: spread.shape, low: spread.low * factor, high: spread.high * factor };
}
