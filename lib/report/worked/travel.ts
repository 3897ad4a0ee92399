import type { Leg, LegsDeparture, VehicleId } from '@/lib/casefile/schema';
import { degrees, figure, inner, pair } from './figure';
import type { Sheet } from './sheet';
import { type Vector, asDegrees, scaled, unit } from './vector';

/** Standard gravity, m/s^2: exact (NIST SP 811). */
const GRAVITY = 9.80665;

/** Writes the lines from rest back to separation and answers the separation velocity, m/s. */
export function separationVelocity(departure: LegsDeparture, id: VehicleId, sheet: Sheet): Vector {
  const { legs, endSpeed, direction } = departure;
  if (legs.length === 0) return givenSeparation(departure, id, sheet);
  sheet.begin(`Travel of ${id}, from its end back to separation`);
  const last = legs.length;
  const squared = legs.reduceRight(
    (after, leg, k) => startOfLeg(leg, k + 1, after, k + 1 === last, sheet),
    endSpeed.value ** 2,
  );
  const s = Math.sqrt(squared);
  sheet.line(
    `Separation speed of ${id}`,
    `s_{${id}}′ = root{v_{1}^2}`,
    `root{${figure(squared)}}`,
    `s_{${id}}′ = ${figure(s)} "m/s"`,
  );
  const v = scaled(unit(direction.value), s);
  writeVelocity(v, s, direction.value, id, sheet);
  return v;
}

function writeVelocity(v: Vector, s: number, direction: number, id: VehicleId, sheet: Sheet): void {
  sheet.line(
    `Separation velocity of ${id}`,
    `!v_{${id}}′ = s_{${id}}′ (cos δ_{${id}}′, sin δ_{${id}}′)`,
    `${figure(s)} (cos ${degrees(direction)}, sin ${degrees(direction)})`,
    `!v_{${id}}′ = ${pair(v)} "m/s"`,
  );
  sheet.end(`${id}.departureSpeed`, s);
  if (s > 1e-9) sheet.end(`${id}.departureDirection`, direction);
}

/** A separation that is given: that of simulated travel. */
function givenSeparation({ endSpeed, direction }: LegsDeparture, id: VehicleId, sheet: Sheet): Vector {
  sheet.begin(`Separation of ${id}, as the simulated travel gives it`);
  const v = scaled(unit(direction.value), endSpeed.value);
  writeVelocity(v, endSpeed.value, direction.value, id, sheet);
  return v;
}

/** Square of the speed at the start of leg number k, from that at its end, m^2/s^2. */
function startOfLeg(leg: Leg, k: number, after: number, isLast: boolean, sheet: Sheet): number {
  const [d, f, q] = [leg.distance.value, leg.friction.value, leg.share.value];
  const slope = Math.atan(leg.grade.value);
  const start = after + 2 * GRAVITY * d * (f * q * Math.cos(slope) + Math.sin(slope));
  const next = isLast ? 'v_{end}' : `v_{${k + 1}}`;
  const level = leg.grade.value === 0;
  if (!level)
    sheet.line(
      `Slope of leg ${k}`,
      `θ_{${k}} = "arctan" G_{${k}}`,
      `"arctan" ${inner(leg.grade.value)}`,
      `θ_{${k}} = ${degrees(asDegrees(slope))}`,
    );
  const uphill = level ? '' : ` cos θ_{${k}} + sin θ_{${k}}`;
  const [open, close] = level ? ['', ''] : ['(', ')'];
  sheet.line(
    `Leg ${k}${level ? ', level' : ''}: square of the speed at its start`,
    `v_{${k}}^2 = ${next}^2 + 2 g d_{${k}} ${open}f_{${k}} q_{${k}}${uphill}${close}`,
    `${figure(after)} + 2 * ${GRAVITY} * ${figure(d)} * ${open}${figure(f)} * ${figure(q)}${
      level ? '' : ` * cos ${degrees(asDegrees(slope))} + sin ${degrees(asDegrees(slope))}`
    }${close}`,
    `v_{${k}}^2 = ${figure(start)} "m²/s²"`,
  );
  return start;
}
