import type { CaseFile, VehicleId } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import type { ContactFrame } from './contact-frame';
import type { Motions } from './contact-motion';
import { degrees, figure, inner, minus, pair } from './figure';
import type { Sheet } from './sheet';
import { type Vector, directionOf, dot, less, perp, size, unit } from './vector';

const STANDING = 1e-9;

/** Writes delta-V of both vehicles, and from it mean acceleration and the seats where the case has them. */
export function speedChangeLines(
  casefile: CaseFile,
  frame: ContactFrame,
  [before, after]: Motions[],
  sheet: Sheet,
): void {
  for (const id of VEHICLE_IDS) {
    sheet.begin(`Delta-V of ${id}`);
    const change = deltaV(id, frame[id].heading, before[id].v, after[id].v, sheet);
    if (casefile.pulse) acceleration(id, change.size, casefile.pulse.value, sheet);
    seats(casefile, id, change, before[id].w, after[id].w, sheet);
  }
}

interface Change {
  size: number;
  forward: number;
  left: number;
}

function deltaV(id: VehicleId, heading: number, before: Vector, after: Vector, sheet: Sheet): Change {
  const change = less(after, before);
  sheet.line(
    'Change of velocity, world axes',
    `Δ!v_{${id}} = !v_{${id}}′ - !v_{${id}}`,
    `(${figure(after.x)} ${minus(before.x)}, ${figure(after.y)} ${minus(before.y)})`,
    `Δ!v_{${id}} = ${pair(change)} "m/s"`,
  );
  const forward = dot(change, unit(heading));
  const left = dot(change, perp(unit(heading)));
  const [sin, cos] = [`sin ${degrees(heading)}`, `cos ${degrees(heading)}`];
  sheet.line(
    'Forward part, along the heading',
    `Δv_{f} = Δv_{x} cos ψ_{${id}} + Δv_{y} sin ψ_{${id}}`,
    `${inner(change.x)} * ${cos} + ${inner(change.y)} * ${sin}`,
    `Δv_{f} = ${figure(forward)} "m/s"`,
  );
  sheet.line(
    'Part to the left',
    `Δv_{l} = -Δv_{x} sin ψ_{${id}} + Δv_{y} cos ψ_{${id}}`,
    `-${inner(change.x)} * ${sin} + ${inner(change.y)} * ${cos}`,
    `Δv_{l} = ${figure(left)} "m/s"`,
  );
  const total = size(change);
  sheet.line(
    `Delta-V of ${id}`,
    `Δv_{${id}} = root{Δv_{f}^2 + Δv_{l}^2}`,
    `root{${inner(forward)}^2 + ${inner(left)}^2}`,
    `Δv_{${id}} = ${figure(total)} "m/s"`,
  );
  const direction = directionOf({ x: forward, y: left });
  if (total > STANDING) {
    sheet.line(
      'Direction of delta-V in vehicle axes',
      '"atan2" (Δv_{l}, Δv_{f})',
      `"atan2" (${figure(left)}, ${figure(forward)})`,
      degrees(direction),
    );
    sheet.end(`${id}.deltaVDirection`, direction);
  }
  sheet.end(`${id}.deltaVForward`, forward);
  sheet.end(`${id}.deltaVLeft`, left);
  sheet.end(`${id}.deltaV`, total);
  return { size: total, forward, left };
}

function acceleration(id: VehicleId, change: number, T: number, sheet: Sheet): void {
  const mean = change / T;
  sheet.line(
    'Mean acceleration over the contact',
    'a_{mean} = frac{Δv}{T}',
    `frac{${figure(change)}}{${figure(T)}}`,
    `a_{mean} = ${figure(mean)} "m/s²"`,
  );
  sheet.line(
    'Peak of a haversine pulse',
    'a_{peak} = 2 a_{mean}',
    `2 * ${figure(mean)}`,
    `a_{peak} = ${figure(2 * mean)} "m/s²"`,
  );
  sheet.end(`${id}.meanAcceleration`, mean);
}

function seats(casefile: CaseFile, id: VehicleId, change: Change, before: number, after: number, sheet: Sheet): void {
  const turn = after - before;
  const list = casefile.vehicles[id].seats ?? [];
  if (list.length === 0) return;
  sheet.line(
    'Change of the yaw rate',
    `Δω_{${id}} = ω_{${id}}′ - ω_{${id}}`,
    `${figure(after)} ${minus(before)}`,
    `Δω_{${id}} = ${figure(turn)} "rad/s"`,
  );
  for (const { name, x, y } of list) {
    const forward = change.forward - turn * y;
    const left = change.left + turn * x;
    const whole = size({ x: forward, y: left });
    sheet.line(
      `At the seat: ${name}`,
      'Δv_{seat} = |(Δv_{f} - Δω y, Δv_{l} + Δω x)|',
      [
        `(${figure(change.forward)} - ${inner(turn)} * ${inner(y)},`,
        `${figure(change.left)} + ${inner(turn)} * ${inner(x)})`,
        ` = ${pair({ x: forward, y: left })}`,
      ],
      `Δv_{seat} = ${figure(whole)} "m/s"`,
    );
    sheet.seats[id].push({ deltaV: whole, deltaVForward: forward, deltaVLeft: left });
  }
}
