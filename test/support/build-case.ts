import type { CaseFile, Departure, Quantity, Vehicle } from '@/lib/casefile/schema';

/** Small cases for tests, built from figures: every quantity fixed unless a spread is given. */

export const q = (value: number, sd?: number): Quantity =>
  sd === undefined ? { value } : { value, spread: { shape: 'normal', sd } };

export const vehicle = (mass: number, yawInertia: number | null = null): Vehicle => ({
  name: 'Test vehicle',
  length: 4.4,
  width: 1.8,
  wheelbase: 2.6,
  track: 1.5,
  frontOverhang: 0.9,
  frontAxleToMassCentre: q(1.15),
  mass: q(mass),
  yawInertia: yawInertia === null ? null : q(yawInertia),
});

/** Leaves the contact at a known speed (m/s) in a known direction (deg). */
export const leaves = (speed: number, direction: number, yawRate: number | null = null): Departure => ({
  kind: 'legs',
  direction: q(direction),
  yawRate: yawRate === null ? null : q(yawRate),
  endSpeed: q(speed),
  legs: [{ distance: q(0), friction: q(0.7), share: q(1), grade: q(0) }],
});

/** Slides to rest over a distance (m) with a friction. */
export const slides = (
  distance: number,
  friction: number,
  direction: number,
  yawRate: number | null = null,
): Departure => ({
  kind: 'legs',
  direction: q(direction),
  yawRate: yawRate === null ? null : q(yawRate),
  endSpeed: q(0),
  legs: [{ distance: q(distance), friction: q(friction), share: q(1), grade: q(0) }],
});

export interface Sketch {
  masses: [number, number];
  inertias?: [number | null, number | null];
  /** Mass centres at contact, m. */
  at?: [[number, number], [number, number]];
  point?: [number, number];
  /** deg */
  plane?: number;
  /** Directions of approach, deg; null where the method does not need one. */
  approach: [number | null, number | null];
  departure: [Departure, Departure];
  method?: CaseFile['analysis']['method'];
  restitution?: number;
  impulseRatio?: number;
  draws?: number;
}

export function buildCase(s: Sketch): CaseFile {
  const at = s.at ?? [
    [-2, 0],
    [2, 0],
  ];
  const pose = ([x, y]: [number, number], heading: number | null) => ({ x: q(x), y: q(y), heading: q(heading ?? 0) });
  const approach = (direction: number | null) => ({
    direction: direction === null ? null : q(direction),
    speed: null,
    yawRate: q(0),
  });
  return {
    format: 'retrodict-case',
    version: 1,
    title: 'Built by a test',
    vehicles: {
      A: vehicle(s.masses[0], s.inertias?.[0] ?? null),
      B: vehicle(s.masses[1], s.inertias?.[1] ?? null),
    },
    impact: {
      A: pose(at[0], s.approach[0]),
      B: pose(at[1], s.approach[1]),
      point: { x: q(s.point?.[0] ?? 0), y: q(s.point?.[1] ?? 0) },
      plane: q(s.plane ?? 90),
      restitution: s.restitution === undefined ? null : q(s.restitution),
      impulseRatio: s.impulseRatio === undefined ? null : q(s.impulseRatio),
    },
    approach: { A: approach(s.approach[0]), B: approach(s.approach[1]) },
    departure: { A: s.departure[0], B: s.departure[1] },
    analysis: { method: s.method ?? 'directions', draws: s.draws ?? 1, seed: 1, coverage: 0.95 },
  };
}
