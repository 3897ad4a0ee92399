import type { CaseFile, LegsDeparture, VehicleId } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import { type Motions, energyLost, momentumBalance, relativeVelocity } from './contact-motion';
import type { ContactFrame } from './contact-frame';
import { degrees, figure, inner, minus, pair } from './figure';
import { type RoadGiven, roadLines } from './road';
import type { Sheet } from './sheet';
import { type Vector, asDegrees, cross, dot, less, radians, scaled, size, sum, unit } from './vector';

/**
 * The method directions, line by line: the momentum of the pair along two known directions of
 * approach gives both speeds; the impulse, and with it restitution and energy, follow.
 */
export function directionsLines(
  casefile: CaseFile,
  frame: ContactFrame,
  v: Record<VehicleId, Vector>,
  road: RoadGiven | null,
  sheet: Sheet,
): Motions[] {
  if (road) roadLines(road, sheet);
  const approach = approachVelocities(casefile, frame, v, road, sheet);
  const J = impulse(frame, approach, v, road, sheet);
  sheet.begin('At the contact point');
  const before = motionsBefore(casefile, approach, sheet);
  const after = motionsAfter(casefile, frame, before, v, J, road, sheet);
  const [u, uAfter] = [relativeVelocity(before, frame, '', sheet), relativeVelocity(after, frame, '′', sheet)];
  const e = -uAfter.un / u.un;
  sheet.line(
    'Restitution',
    'e = -frac{u_{n}′}{u_{n}}',
    `-frac{${figure(uAfter.un)}}{${figure(u.un)}}`,
    `e = ${figure(e)}`,
  );
  sheet.end('closingSpeed', u.un);
  sheet.end('slidingSpeed', u.ut);
  sheet.end('restitution', e);
  energyLost(J, u, uAfter, frame, sheet);
  momentumBalance(before, after, frame, sheet);
  return [before, after];
}

function approachVelocities(
  casefile: CaseFile,
  frame: ContactFrame,
  v: Record<VehicleId, Vector>,
  road: RoadGiven | null,
  sheet: Sheet,
): Record<VehicleId, Vector> {
  const { A, B } = frame;
  sheet.begin('Momentum of the pair, and the approach speeds');
  const after = sum(scaled(v.A, A.m), scaled(v.B, B.m));
  const p = road ? less(less(after, road.A.impulse), road.B.impulse) : after;
  const component = (key: 'x' | 'y'): string =>
    `${figure(A.m)} * ${inner(v.A[key])} + ${figure(B.m)} * ${inner(v.B[key])}` +
    (road ? ` ${minus(road.A.impulse[key])} ${minus(road.B.impulse[key])}` : '');
  sheet.line(
    road ? 'Momentum after contact, less what the road gave' : 'Momentum after contact',
    `!p = m_{A} !v_{A}′ + m_{B} !v_{B}′${road ? ' - !T_{A} - !T_{B}' : ''}`,
    [`(${component('x')},`, `${component('y')})`],
    `!p = ${pair(p)} "kg m/s"`,
  );
  const h = { A: directionOfApproach(casefile, 'A', sheet), B: directionOfApproach(casefile, 'B', sheet) };
  const sine = cross(h.A, h.B);
  sheet.line(
    'Sine of the angle between the approach directions',
    'sin φ = h_{Ax} h_{By} - h_{Ay} h_{Bx}',
    `${inner(h.A.x)} * ${inner(h.B.y)} - ${inner(h.A.y)} * ${inner(h.B.x)}`,
    `sin φ = ${figure(sine)}`,
  );
  const solved = {
    A: speed('A', 'p_{x} h_{By} - p_{y} h_{Bx}', [p.x, h.B.y, p.y, h.B.x], A.m, sine, sheet),
    B: speed('B', 'h_{Ax} p_{y} - h_{Ay} p_{x}', [h.A.x, p.y, h.A.y, p.x], B.m, sine, sheet),
  };
  const velocity = (id: VehicleId): Vector => {
    const vBefore = scaled(h[id], solved[id]);
    sheet.line(
      `Approach velocity of ${id}`,
      `!v_{${id}} = s_{${id}} !h_{${id}}`,
      `${figure(solved[id])} * ${pair(h[id])}`,
      `!v_{${id}} = ${pair(vBefore)} "m/s"`,
    );
    return vBefore;
  };
  return { A: velocity('A'), B: velocity('B') };
}

function directionOfApproach(casefile: CaseFile, id: VehicleId, sheet: Sheet): Vector {
  const direction = casefile.approach[id].direction?.value ?? NaN;
  const h = unit(direction);
  sheet.line(
    `Unit vector of the approach of ${id}`,
    `!h_{${id}} = (cos δ_{${id}}, sin δ_{${id}})`,
    `(cos ${degrees(direction)}, sin ${degrees(direction)})`,
    `!h_{${id}} = ${pair(h)}`,
  );
  sheet.end(`${id}.approachDirection`, direction);
  return h;
}

/** One row of the inverted 2 x 2 system: (a b - c d) / (m sin). */
function speed(id: VehicleId, over: string, [a, b, c, d]: number[], m: number, sine: number, sheet: Sheet): number {
  const s = (a * b - c * d) / (m * sine);
  sheet.line(
    `Approach speed of ${id}`,
    `s_{${id}} = frac{${over}}{m_{${id}} sin φ}`,
    `frac{${inner(a)} * ${inner(b)} - ${inner(c)} * ${inner(d)}}{${figure(m)} * ${inner(sine)}}`,
    `s_{${id}} = ${figure(s)} "m/s"`,
  );
  sheet.end(`${id}.approachSpeed`, s);
  return s;
}

function impulse(
  frame: ContactFrame,
  before: Record<VehicleId, Vector>,
  after: Record<VehicleId, Vector>,
  road: RoadGiven | null,
  sheet: Sheet,
): Vector {
  sheet.begin('Impulse');
  const m = frame.B.m;
  const change = scaled(less(after.B, before.B), m);
  const J = road ? less(change, road.B.impulse) : change;
  const component = (key: 'x' | 'y'): string =>
    `${figure(m)} * (${figure(after.B[key])} ${minus(before.B[key])}) ${minus(road?.B.impulse[key] ?? 0)}`;
  sheet.line(
    'Impulse on B (that on A is its opposite)',
    `!J = m_{B} (!v_{B}′ - !v_{B})${road ? ' - !T_{B}' : ''}`,
    road
      ? [`(${component('x')},`, `${component('y')})`]
      : `${figure(m)} (${figure(after.B.x)} ${minus(before.B.x)}, ${figure(after.B.y)} ${minus(before.B.y)})`,
    `!J = ${pair(J)} "N s"`,
  );
  const part = (key: 'n' | 't', words: string): number => {
    const e = frame[key];
    const along = dot(J, e);
    sheet.line(
      words,
      `J_{${key}} = J_{x} ${key}_{x} + J_{y} ${key}_{y}`,
      `${inner(J.x)} * ${inner(e.x)} + ${inner(J.y)} * ${inner(e.y)}`,
      `J_{${key}} = ${figure(along)} "N s"`,
    );
    return along;
  };
  const [Jn, Jt] = [part('n', 'Normal impulse'), part('t', 'Tangential impulse')];
  sheet.line(
    'Size of the impulse',
    'J = root{J_{n}^2 + J_{t}^2}',
    `root{${inner(Jn)}^2 + ${inner(Jt)}^2}`,
    `J = ${figure(size(J))} "N s"`,
  );
  sheet.line('Impulse ratio', 'μ = frac{J_{t}}{J_{n}}', `frac{${figure(Jt)}}{${figure(Jn)}}`, `μ = ${figure(Jt / Jn)}`);
  sheet.end('impulse', size(J));
  sheet.end('impulseRatio', Jt / Jn);
  return J;
}

function motionsBefore(casefile: CaseFile, v: Record<VehicleId, Vector>, sheet: Sheet): Motions {
  const motion = (id: VehicleId) => {
    const rate = casefile.approach[id].yawRate.value;
    sheet.end(`${id}.approachYawRate`, rate);
    return { v: v[id], w: radians(rate) };
  };
  const motions = { A: motion('A'), B: motion('B') };
  for (const id of VEHICLE_IDS)
    if (motions[id].w !== 0)
      sheet.line(
        `Yaw rate of ${id} before contact, as stated`,
        `ω_{${id}} = frac{π}{180} w_{${id}}`,
        `frac{π}{180} * ${inner(casefile.approach[id].yawRate.value)}`,
        `ω_{${id}} = ${figure(motions[id].w)} "rad/s"`,
      );
  return motions;
}

/** Yaw rates after contact: as the impulse predicts them; where one was measured, that one is used. */
function motionsAfter(
  casefile: CaseFile,
  frame: ContactFrame,
  before: Motions,
  v: Record<VehicleId, Vector>,
  J: Vector,
  road: RoadGiven | null,
  sheet: Sheet,
): Motions {
  const motion = (id: VehicleId) => {
    const { I, d } = frame[id];
    const turn = cross(d, J) / I;
    const sign = id === 'A' ? '-' : '+';
    const byRoad = road?.[id].yawRate ?? 0;
    const predicted = before[id].w + (id === 'A' ? -turn : turn) + byRoad;
    sheet.line(
      `Yaw rate of ${id} after contact that the impulse predicts`,
      `ω_{${id}}′ = ω_{${id}} ${sign} frac{d_{x} J_{y} - d_{y} J_{x}}{I_{${id}}}${road ? ` + τ_{${id}}` : ''}`,
      `${figure(before[id].w)} ${sign} frac{${inner(d.x)} * ${inner(J.y)} - ${inner(d.y)} * ${inner(J.x)}}{${figure(I)}}${road ? ` ${minus(-byRoad)}` : ''}`,
      `ω_{${id}}′ = ${figure(predicted)} "rad/s" = ${figure(asDegrees(predicted))}" °/s"`,
    );
    return { v: v[id], w: measuredRate(casefile.departure[id] as LegsDeparture, id, sheet) ?? predicted };
  };
  const motions = { A: motion('A'), B: motion('B') };
  for (const id of VEHICLE_IDS) sheet.end(`${id}.departureYawRate`, asDegrees(motions[id].w));
  return motions;
}

function measuredRate(departure: LegsDeparture, id: VehicleId, sheet: Sheet): number | null {
  if (!departure.yawRate) return null;
  const w = radians(departure.yawRate.value);
  sheet.line(
    `Yaw rate of ${id} after contact as measured, used from here on`,
    `ω_{${id}}′ = frac{π}{180} w_{${id}}′`,
    `frac{π}{180} * ${inner(departure.yawRate.value)}`,
    `ω_{${id}}′ = ${figure(w)} "rad/s"`,
  );
  return w;
}
