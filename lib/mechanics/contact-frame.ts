import { cos, sin } from '@/lib/numerics/elementary';

/** A rigid vehicle in the plane: mass kg, yaw inertia kg m^2, mass centre m. */
export interface Body {
  m: number;
  I: number;
  x: number;
  y: number;
}

/** Two bodies that touch at the point (px, py), m, along a plane with direction angle `plane`, rad. */
export interface Contact {
  A: Body;
  B: Body;
  px: number;
  py: number;
  plane: number;
}

/** The axes and the inverse masses of a contact. */
export interface ContactFrame {
  /** Unit normal, pointing from A into B; the unit tangent is (-ny, nx). */
  nx: number;
  ny: number;
  /** From the mass centres to the contact point, m. */
  dAx: number;
  dAy: number;
  dBx: number;
  dBy: number;
  /** Inverse effective masses at the contact point, 1/kg. */
  Knn: number;
  Ktt: number;
  Knt: number;
}

export const emptyFrame = (): ContactFrame => ({
  nx: 0,
  ny: 0,
  dAx: 0,
  dAy: 0,
  dBx: 0,
  dBy: 0,
  Knn: 0,
  Ktt: 0,
  Knt: 0,
});

export const cross = (ax: number, ay: number, bx: number, by: number): number => ax * by - ay * bx;

/** Sets the frame of a contact. Source: Brach & Brach, Vehicle Accident Analysis and Reconstruction Methods (planar impact). */
export function setFrame({ A, B, px, py, plane }: Contact, out: ContactFrame): void {
  let nx = sin(plane);
  let ny = -cos(plane);
  if (nx * (B.x - A.x) + ny * (B.y - A.y) < 0) {
    nx = -nx;
    ny = -ny;
  }
  out.nx = nx;
  out.ny = ny;
  out.dAx = px - A.x;
  out.dAy = py - A.y;
  out.dBx = px - B.x;
  out.dBy = py - B.y;
  setInverseMasses(A, B, out);
}

function setInverseMasses(A: Body, B: Body, out: ContactFrame): void {
  const { nx, ny } = out;
  const masses = 1 / A.m + 1 / B.m;
  const aA = cross(out.dAx, out.dAy, nx, ny);
  const bA = cross(out.dAx, out.dAy, -ny, nx);
  const aB = cross(out.dBx, out.dBy, nx, ny);
  const bB = cross(out.dBx, out.dBy, -ny, nx);
  out.Knn = masses + (aA * aA) / A.I + (aB * aB) / B.I;
  out.Ktt = masses + (bA * bA) / A.I + (bB * bB) / B.I;
  out.Knt = (aA * bA) / A.I + (aB * bB) / B.I;
}

/** The most energy that a contact closing at (un, ut) can take, J: u . K^-1 . u / 2. */
export const closingEnergyOf = ({ Knn, Ktt, Knt }: ContactFrame, un: number, ut: number): number =>
  (Ktt * un * un - 2 * Knt * un * ut + Knn * ut * ut) / (2 * (Knn * Ktt - Knt * Knt));
