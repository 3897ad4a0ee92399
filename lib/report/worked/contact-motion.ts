import { VEHICLE_IDS, type VehicleId } from '@/lib/casefile/schema';
import type { ContactFrame } from './contact-frame';
import { figure, inner, minus, pair } from './figure';
import type { Sheet } from './sheet';
import { type Vector, dot, less, perp, scaled, sum } from './vector';

/** Motion of one vehicle: velocity of its mass centre m/s, yaw rate rad/s. */
export interface Motion {
  v: Vector;
  w: number;
}
export type Motions = Record<VehicleId, Motion>;

/** Relative velocity at the contact point, m/s: as a vector, along the normal and along the tangent. */
export interface Relative {
  u: Vector;
  un: number;
  ut: number;
}

/** Writes the lines of the relative velocity at the contact point; `prime` is ′ after contact. */
export function relativeVelocity(motions: Motions, frame: ContactFrame, prime: '' | '′', sheet: Sheet): Relative {
  const c = {
    A: contactVelocity('A', motions.A, frame, prime, sheet),
    B: contactVelocity('B', motions.B, frame, prime, sheet),
  };
  const u = less(c.A, c.B);
  const when = prime === '' ? 'before' : 'after';
  sheet.line(
    `Relative velocity at the contact point, ${when}`,
    `!u${prime} = !c_{A}${prime} - !c_{B}${prime}`,
    `(${figure(c.A.x)} ${minus(c.B.x)}, ${figure(c.A.y)} ${minus(c.B.y)})`,
    `!u${prime} = ${pair(u)} "m/s"`,
  );
  const along = (key: 'n' | 't', e: Vector): number => {
    const part = dot(u, e);
    sheet.line(
      PART_WORDS[key + prime],
      `u_{${key}}${prime} = u_{x}${prime} ${key}_{x} + u_{y}${prime} ${key}_{y}`,
      `${inner(u.x)} * ${inner(e.x)} + ${inner(u.y)} * ${inner(e.y)}`,
      `u_{${key}}${prime} = ${figure(part)} "m/s"`,
    );
    return part;
  };
  return { u, un: along('n', frame.n), ut: along('t', frame.t) };
}

const PART_WORDS: Record<string, string> = {
  n: 'Closing speed (normal)',
  t: 'Sliding speed (tangential)',
  'n′': 'Normal part after contact (negative: parting)',
  't′': 'Tangential part after contact',
};

function contactVelocity(id: VehicleId, { v, w }: Motion, frame: ContactFrame, prime: string, sheet: Sheet): Vector {
  const d = frame[id].d;
  const c = sum(v, scaled(perp(d), w));
  sheet.line(
    `Velocity of the contact point on ${id}, ${prime === '' ? 'before' : 'after'}`,
    `!c_{${id}}${prime} = (v_{x}${prime} - ω${prime} d_{y}, v_{y}${prime} + ω${prime} d_{x})`,
    [`(${figure(v.x)} - ${inner(w)} * ${inner(d.y)},`, `${figure(v.y)} + ${inner(w)} * ${inner(d.x)})`],
    `!c_{${id}}${prime} = ${pair(c)} "m/s"`,
  );
  return c;
}

/** Writes the energy lost to crush and sliding and its share of what the contact could take, J. */
export function energyLost(J: Vector, before: Relative, after: Relative, frame: ContactFrame, sheet: Sheet): number {
  const both = sum(before.u, after.u);
  const E = dot(J, both) / 2;
  sheet.line(
    'Energy lost to crush and sliding',
    'E = frac{1}{2} !J * (!u + !u′)',
    `frac{1}{2} [${inner(J.x)} * ${inner(both.x)} + ${inner(J.y)} * ${inner(both.y)}]`,
    `E = ${figure(E)} "J"`,
  );
  const { Knn, Ktt, Knt } = frame;
  const { un, ut } = before;
  const D = Knn * Ktt - Knt * Knt;
  sheet.line(
    'Determinant of the inverse masses',
    'D = K_{nn} K_{tt} - K_{nt}^2',
    `${inner(Knn)} * ${inner(Ktt)} - ${inner(Knt)}^2`,
    `D = ${figure(D)} "kg"^{-2}`,
  );
  const most = (Ktt * un * un - 2 * Knt * un * ut + Knn * ut * ut) / (2 * D);
  sheet.line(
    'The most that the contact could take (closing energy)',
    'E_{c} = frac{1}{2 D} [K_{tt} u_{n}^2 - 2 K_{nt} u_{n} u_{t} + K_{nn} u_{t}^2]',
    [
      `frac{1}{2 * ${inner(D)}} [${inner(Ktt)} * ${inner(un)}^2`,
      `- 2 * ${inner(Knt)} * ${inner(un)} * ${inner(ut)}`,
      `+ ${inner(Knn)} * ${inner(ut)}^2]`,
    ],
    `E_{c} = ${figure(most)} "J"`,
  );
  sheet.line(
    'Share of the closing energy that was lost',
    'frac{E}{E_{c}}',
    `frac{${figure(E)}}{${figure(most)}}`,
    `"share" = ${figure(E / most)}`,
  );
  sheet.end('energyLost', E);
  return E;
}

/** Momentum of the pair before and after, written out for the reader to compare. */
export function momentumBalance(before: Motions, after: Motions, frame: ContactFrame, sheet: Sheet): void {
  sheet.begin('Balance of momentum');
  for (const [motions, prime, when] of [
    [before, '', 'before'],
    [after, '′', 'after'],
  ] as const) {
    const part = (axis: 'x' | 'y'): string =>
      VEHICLE_IDS.map((id) => `${figure(frame[id].m)} * ${inner(motions[id].v[axis])}`).join(' + ');
    const p = sum(scaled(motions.A.v, frame.A.m), scaled(motions.B.v, frame.B.m));
    sheet.line(
      `Momentum of the pair ${when} contact`,
      `!p${prime} = m_{A} !v_{A}${prime} + m_{B} !v_{B}${prime}`,
      [`(${part('x')},`, `${part('y')})`],
      `!p${prime} = ${pair(p)} "kg m/s"`,
    );
  }
}
