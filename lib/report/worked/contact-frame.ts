import type { CaseFile, VehicleId } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import { degrees, figure, inner, minus, pair } from './figure';
import type { Sheet } from './sheet';
import { type Vector, cross, dot, less, perp, radians, scaled } from './vector';

/** A vehicle at contact: mass kg, yaw inertia kg m^2, arm from mass centre to contact point m, heading deg. */
export interface Body {
  m: number;
  I: number;
  d: Vector;
  /** Lever arms of the unit normal and the unit tangent, m. */
  a: number;
  b: number;
  heading: number;
}

/** The contact frame and the inverse effective masses, 1/kg. */
export interface ContactFrame {
  n: Vector;
  t: Vector;
  A: Body;
  B: Body;
  Knn: number;
  Ktt: number;
  Knt: number;
}

/** Ratio of yaw inertia to mass times both axle distances: mean of 73 cars, SAE 1999-01-1336. */
const DYNAMIC_INDEX = 1.091;

/** Writes the lines of the contact frame and answers it. */
export function contactFrame(casefile: CaseFile, sheet: Sheet): ContactFrame {
  sheet.begin('Vehicles and contact frame');
  const I = { A: yawInertia(casefile, 'A', sheet), B: yawInertia(casefile, 'B', sheet) };
  const n = normal(casefile, sheet);
  const t = perp(n);
  sheet.line('Unit tangent', '!t = (-n_{y}, n_{x})', pair(t), `!t = ${pair(t)}`);
  const A = body(casefile, 'A', I.A, n, t, sheet);
  const B = body(casefile, 'B', I.B, n, t, sheet);
  return { n, t, A, B, ...inverseMasses(A, B, sheet) };
}

function yawInertia(casefile: CaseFile, id: VehicleId, sheet: Sheet): number {
  const { mass, frontAxleToMassCentre, wheelbase, yawInertia: stated } = casefile.vehicles[id];
  if (stated) return stated.value;
  const front = frontAxleToMassCentre.value;
  const I = DYNAMIC_INDEX * mass.value * front * (wheelbase - front);
  sheet.line(
    `Yaw inertia of ${id}, estimated from its mass and axle distances`,
    `I_{${id}} = 1.091 m_{${id}} l_{f} (L - l_{f})`,
    `1.091 * ${figure(mass.value)} * ${figure(front)} * (${figure(wheelbase)} - ${figure(front)})`,
    `I_{${id}} = ${figure(I)} "kg m²"`,
  );
  return I;
}

const positionOf = (casefile: CaseFile, id: VehicleId): Vector => ({
  x: casefile.impact[id].x.value,
  y: casefile.impact[id].y.value,
});

function normal(casefile: CaseFile, sheet: Sheet): Vector {
  const plane = casefile.impact.plane.value;
  const either: Vector = { x: Math.sin(radians(plane)), y: -Math.cos(radians(plane)) };
  const apart = less(positionOf(casefile, 'B'), positionOf(casefile, 'A'));
  const towards = dot(either, apart) >= 0;
  const n = towards ? either : scaled(either, -1);
  sheet.line(
    'Unit normal of the contact plane, pointing from A into B',
    towards ? '!n = (sin Γ, -cos Γ)' : '!n = (-sin Γ, cos Γ), turned to point into B',
    towards ? `(sin ${degrees(plane)}, -cos ${degrees(plane)})` : `(-sin ${degrees(plane)}, cos ${degrees(plane)})`,
    `!n = ${pair(n)}`,
  );
  return n;
}

function body(casefile: CaseFile, id: VehicleId, I: number, n: Vector, t: Vector, sheet: Sheet): Body {
  const { point } = casefile.impact;
  const r = positionOf(casefile, id);
  const d = less({ x: point.x.value, y: point.y.value }, r);
  sheet.line(
    `Arm of ${id}: from its mass centre to the contact point`,
    `!d_{${id}} = !P - !r_{${id}}`,
    `(${figure(point.x.value)} ${minus(r.x)}, ${figure(point.y.value)} ${minus(r.y)})`,
    `!d_{${id}} = ${pair(d)} "m"`,
  );
  const a = cross(d, n);
  const b = cross(d, t);
  const lever = (name: string, e: string, along: Vector): [string, string] => [
    `${name}_{${id}} = d_{x} ${e}_{y} - d_{y} ${e}_{x}`,
    `${inner(d.x)} * ${inner(along.y)} - ${inner(d.y)} * ${inner(along.x)}`,
  ];
  sheet.line(`Lever arm of the normal on ${id}`, ...lever('a', 'n', n), `a_{${id}} = ${figure(a)} "m"`);
  sheet.line(`Lever arm of the tangent on ${id}`, ...lever('b', 't', t), `b_{${id}} = ${figure(b)} "m"`);
  return { m: casefile.vehicles[id].mass.value, I, d, a, b, heading: casefile.impact[id].heading.value };
}

function inverseMasses(A: Body, B: Body, sheet: Sheet): Pick<ContactFrame, 'Knn' | 'Ktt' | 'Knt'> {
  const bodies = { A, B };
  const masses = 1 / A.m + 1 / B.m;
  const Knn = masses + A.a ** 2 / A.I + B.a ** 2 / B.I;
  const Ktt = masses + A.b ** 2 / A.I + B.b ** 2 / B.I;
  const Knt = (A.a * A.b) / A.I + (B.a * B.b) / B.I;
  const reciprocal = VEHICLE_IDS.map((id) => `frac{1}{${figure(bodies[id].m)}}`).join(' + ');
  const squares = (key: 'a' | 'b') =>
    VEHICLE_IDS.map((id) => `frac{${inner(bodies[id][key])}^2}{${figure(bodies[id].I)}}`).join(' + ');
  const general = (key: string) =>
    `frac{1}{m_{A}} + frac{1}{m_{B}} + frac{${key}_{A}^2}{I_{A}} + frac{${key}_{B}^2}{I_{B}}`;
  sheet.line(
    'Inverse effective mass, normal',
    `K_{nn} = ${general('a')}`,
    `${reciprocal} + ${squares('a')}`,
    `K_{nn} = ${figure(Knn)} "kg"^{-1}`,
  );
  sheet.line(
    'Inverse effective mass, tangential',
    `K_{tt} = ${general('b')}`,
    `${reciprocal} + ${squares('b')}`,
    `K_{tt} = ${figure(Ktt)} "kg"^{-1}`,
  );
  sheet.line(
    'Coupling of normal and tangential',
    'K_{nt} = frac{a_{A} b_{A}}{I_{A}} + frac{a_{B} b_{B}}{I_{B}}',
    VEHICLE_IDS.map((id) => `frac{${inner(bodies[id].a)} * ${inner(bodies[id].b)}}{${figure(bodies[id].I)}}`).join(
      ' + ',
    ),
    `K_{nt} = ${figure(Knt)} "kg"^{-1}`,
  );
  return { Knn, Ktt, Knt };
}
