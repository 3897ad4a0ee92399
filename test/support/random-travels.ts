import { type Ground, TyreMotion, fourWheels } from '@/lib/mechanics/spin';
import { fillUniforms, seededState } from '@/lib/numerics/random';

/** Travels to rest of four kinds from random separations; the same ones for the same seed. */

export const KINDS = ['locked', 'partly braked', 'free rolling', 'steered'] as const;
export type Kind = (typeof KINDS)[number];

export interface Travel {
  motion: TyreMotion;
  start: number[];
}

type Between = (low: number, high: number) => number;

/** Shares of braking and steer (rad) of the four wheels. */
const settings: Record<Kind, (between: Between) => { braking: number; steer: number }[]> = {
  locked: () => [1, 1, 1, 1].map((braking) => ({ braking, steer: 0 })),
  'partly braked': (between) => [0, 1, 2, 3].map(() => ({ braking: between(0.05, 1), steer: 0 })),
  'free rolling': () => [0, 0, 0, 0].map((braking) => ({ braking, steer: 0 })),
  steered: (between) => {
    const steer = between(-0.5, 0.5);
    return [steer, steer, 0, 0].map((turn) => ({ braking: between(0.05, 0.8), steer: turn }));
  },
};

function randomTravel(kind: Kind, between: Between): Travel {
  const m = between(900, 2200);
  const wheelbase = between(2.4, 3);
  const front = wheelbase * between(0.38, 0.5);
  const car = { m, wheelbase, track: between(1.4, 1.6), frontAxleToMassCentre: front };
  const vehicle = { m, I: 1.09 * m * front * (wheelbase - front), wheels: fourWheels(car, settings[kind](between)) };
  const ground: Ground = { friction: between(0.4, 0.85), frictionAt: null, grade: 0, uphill: 0 };
  const [speed, course] = [between(2, 10), between(-Math.PI, Math.PI)];
  const start = [0, 0, 0, speed * Math.cos(course), speed * Math.sin(course), between(-4, 4)];
  return { motion: new TyreMotion(vehicle, ground, 0), start };
}

export function randomTravels(kind: Kind, count: number, seed: number): Travel[] {
  const uniforms = new Float64Array(count * 20);
  fillUniforms(seededState(seed, kind, 0), uniforms, uniforms.length);
  let at = 0;
  const between: Between = (low, high) => low + (high - low) * uniforms[at++];
  return Array.from({ length: count }, () => randomTravel(kind, between));
}

/** How far apart two ends of a travel lie, m, and how far turned, rad. */
export const apart = (a: { x: number; y: number; heading: number }, b: typeof a): { place: number; turn: number } => ({
  place: Math.hypot(a.x - b.x, a.y - b.y),
  turn: Math.abs(a.heading - b.heading),
});
