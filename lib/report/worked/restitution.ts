import type { CaseFile, LegsDeparture, VehicleId } from '@/lib/casefile/schema';
import type { ContactFrame } from './contact-frame';
import { type Motion, type Motions, energyLost, momentumBalance, relativeVelocity } from './contact-motion';
import { degrees, figure, inner, minus, pair } from './figure';
import type { Sheet } from './sheet';
import { type Vector, asDegrees, cross, directionOf, radians, scaled, size, sum } from './vector';

/** Below this a speed has no direction, m/s. */
const STANDING = 1e-9;

/**
 * The method restitution, line by line: how the bodies part, with the restitution, gives how they
 * closed; the impulse takes each back to its approach.
 */
export function restitutionLines(
  casefile: CaseFile,
  frame: ContactFrame,
  v: Record<VehicleId, Vector>,
  sheet: Sheet,
): Motions[] {
  sheet.begin('At the contact point, after');
  const after = { A: motionAfter(casefile, 'A', v.A, sheet), B: motionAfter(casefile, 'B', v.B, sheet) };
  const parted = relativeVelocity(after, frame, '′', sheet);
  const J = impulse(casefile, frame, parted.un, sheet);
  sheet.begin('Approach');
  const before = { A: motionBefore('A', after.A, J, frame, sheet), B: motionBefore('B', after.B, J, frame, sheet) };
  sheet.begin('At the contact point, before');
  const closed = relativeVelocity(before, frame, '', sheet);
  sheet.end('closingSpeed', closed.un);
  sheet.end('slidingSpeed', closed.ut);
  energyLost(J, closed, parted, frame, sheet);
  momentumBalance(before, after, frame, sheet);
  return [before, after];
}

function motionAfter(casefile: CaseFile, id: VehicleId, v: Vector, sheet: Sheet): Motion {
  const rate = (casefile.departure[id] as LegsDeparture).yawRate?.value ?? NaN;
  const w = radians(rate);
  sheet.line(
    `Yaw rate of ${id} after contact, as measured`,
    `ω_{${id}}′ = frac{π}{180} w_{${id}}′`,
    `frac{π}{180} * ${inner(rate)}`,
    `ω_{${id}}′ = ${figure(w)} "rad/s"`,
  );
  sheet.end(`${id}.departureYawRate`, rate);
  return { v, w };
}

function impulse(casefile: CaseFile, frame: ContactFrame, parting: number, sheet: Sheet): Vector {
  const e = casefile.impact.restitution?.value ?? NaN;
  const mu = casefile.impact.impulseRatio?.value ?? NaN;
  const { Knn, Knt, n, t } = frame;
  sheet.begin('Impulse');
  const closing = -parting / e;
  sheet.line(
    'Closing speed from restitution',
    'u_{n} = -frac{u_{n}′}{e}',
    `-frac{${figure(parting)}}{${figure(e)}}`,
    `u_{n} = ${figure(closing)} "m/s"`,
  );
  const Jn = (closing - parting) / (Knn + mu * Knt);
  sheet.line(
    'Normal impulse',
    'J_{n} = frac{u_{n} - u_{n}′}{K_{nn} + μ K_{nt}}',
    `frac{${figure(closing)} ${minus(parting)}}{${figure(Knn)} + ${inner(mu)} * ${inner(Knt)}}`,
    `J_{n} = ${figure(Jn)} "N s"`,
  );
  const Jt = mu * Jn;
  sheet.line('Tangential impulse', 'J_{t} = μ J_{n}', `${inner(mu)} * ${inner(Jn)}`, `J_{t} = ${figure(Jt)} "N s"`);
  const J = sum(scaled(n, Jn), scaled(t, Jt));
  sheet.line(
    'Impulse on B (that on A is its opposite)',
    '!J = J_{n} !n + J_{t} !t',
    `${figure(Jn)} * ${pair(n)} + ${inner(Jt)} * ${pair(t)}`,
    `!J = ${pair(J)} "N s"`,
  );
  sheet.line(
    'Size of the impulse',
    'J = root{J_{n}^2 + J_{t}^2}',
    `root{${inner(Jn)}^2 + ${inner(Jt)}^2}`,
    `J = ${figure(size(J))} "N s"`,
  );
  sheet.end('restitution', e);
  sheet.end('impulseRatio', mu);
  sheet.end('impulse', size(J));
  return J;
}

function motionBefore(id: VehicleId, after: Motion, J: Vector, frame: ContactFrame, sheet: Sheet): Motion {
  const { m, I, d } = frame[id];
  const back = id === 'A' ? 1 : -1;
  const sign = id === 'A' ? '+' : '-';
  const v = sum(after.v, scaled(J, back / m));
  sheet.line(
    `Approach velocity of ${id}`,
    `!v_{${id}} = !v_{${id}}′ ${sign} frac{!J}{m_{${id}}}`,
    `${pair(after.v)} ${sign} frac{${pair(J)}}{${figure(m)}}`,
    `!v_{${id}} = ${pair(v)} "m/s"`,
  );
  const w = after.w + (back * cross(d, J)) / I;
  sheet.line(
    `Yaw rate of ${id} before contact`,
    `ω_{${id}} = ω_{${id}}′ ${sign} frac{d_{x} J_{y} - d_{y} J_{x}}{I_{${id}}}`,
    `${figure(after.w)} ${sign} frac{${inner(d.x)} * ${inner(J.y)} - ${inner(d.y)} * ${inner(J.x)}}{${figure(I)}}`,
    `ω_{${id}} = ${figure(w)} "rad/s" = ${figure(asDegrees(w))}" °/s"`,
  );
  const s = size(v);
  sheet.line(
    `Approach speed of ${id}`,
    `s_{${id}} = root{v_{x}^2 + v_{y}^2}`,
    `root{${inner(v.x)}^2 + ${inner(v.y)}^2}`,
    `s_{${id}} = ${figure(s)} "m/s"`,
  );
  if (s > STANDING) {
    sheet.line(
      `Direction of approach of ${id}`,
      `δ_{${id}} = "atan2" (v_{y}, v_{x})`,
      `"atan2" (${figure(v.y)}, ${figure(v.x)})`,
      `δ_{${id}} = ${degrees(directionOf(v))}`,
    );
    sheet.end(`${id}.approachDirection`, directionOf(v));
  }
  sheet.end(`${id}.approachSpeed`, s);
  sheet.end(`${id}.approachYawRate`, asDegrees(w));
  return { v, w };
}
