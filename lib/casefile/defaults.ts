import type { CaseFile, Damage, Departure, Leg, Quantity, Surface, Vehicle } from './schema';

/** The source of a value that nobody has touched; shown and printed as such. */
export const DEFAULT_SOURCE = 'default, not measured';
/** The source given to a value that was set by drawing. */
export const DRAWN_SOURCE = 'drawn on the board';

/** Particles of a fit where the case leaves their number open, and the most that it takes. */
export const DEFAULT_PARTICLES = 4000;
export const MOST_PARTICLES = 200_000;

export const DEFAULT_DRAWS = 20_000;
export const DEFAULT_SEED = 1;
export const DEFAULT_COVERAGE = 0.95;

const normal = (value: number, sd: number): Quantity => ({
  value,
  spread: { shape: 'normal', sd },
  source: DEFAULT_SOURCE,
});
const rectangular = (value: number, low: number, high: number): Quantity => ({
  value,
  spread: { shape: 'rectangular', low, high },
  source: DEFAULT_SOURCE,
});
const fixed = (value: number): Quantity => ({ value, spread: { shape: 'fixed' }, source: DEFAULT_SOURCE });

/** A quantity as drawn on the board, with the spread that a drawing deserves (typical uncertainties, screening values). */
export const drawnQuantity = (value: number, sd: number): Quantity => ({
  value,
  spread: { shape: 'normal', sd },
  source: DRAWN_SOURCE,
});

/** An invented mid-size car; every figure is a default, not a measurement. */
const defaultVehicle = (name: string): Vehicle => ({
  name,
  length: 4.4,
  width: 1.8,
  wheelbase: 2.6,
  track: 1.5,
  frontOverhang: 0.9,
  frontAxleToMassCentre: normal(1.15, 0.05),
  mass: normal(1400, 40),
  yawInertia: null,
  seats: [],
});

const defaultPose = (x: number, heading: number) => ({
  x: normal(x, 0.1),
  y: normal(0, 0.1),
  heading: normal(heading, 2),
});

/**
 * One leg over dry asphalt. Friction N(0.74, 0.06): dry asphalt, typical uncertainties of the trade; share 0.5 with
 * limits wide enough to say that nobody has looked yet.
 */
export const defaultLeg = (distance: number): Leg => ({
  distance: { value: distance, spread: { shape: 'normal', sd: 0.15 }, source: DRAWN_SOURCE },
  friction: normal(0.74, 0.06),
  share: rectangular(0.5, 0.2, 0.8),
  grade: fixed(0),
});

/** Straight travel after contact, from a direction (deg) and a distance (m). */
export const defaultDeparture = (direction: number, distance: number): Departure => ({
  kind: 'legs',
  direction: drawnQuantity(direction, 3),
  yawRate: null,
  endSpeed: fixed(0),
  legs: [defaultLeg(distance)],
});

/** Travel simulated to a rest pose (m, deg): half braked all round on dry asphalt, until somebody looks. */
export const defaultSpin = (x: number, y: number, heading: number): Departure => ({
  kind: 'spin',
  rest: { x: drawnQuantity(x, 0.1), y: drawnQuantity(y, 0.1), heading: drawnQuantity(heading, 2) },
  friction: normal(0.74, 0.06),
  slope: null,
  onset: null,
  wheels: { all: { braking: rectangular(0.5, 0.2, 0.8) } },
});

/** A depth of damage to begin with, m. */
export const defaultDepth = (): Quantity => normal(0.02, 0.01);

/** Damage to begin with: shallow over a bumper's width, with the stiffness of no vehicle in particular. */
export const defaultDamage = (): Damage => ({
  depths: Array.from({ length: 4 }, defaultDepth),
  width: normal(1.2, 0.1),
  forceAngle: normal(0, 10),
  a: normal(40_000, 15_000),
  b: normal(600_000, 250_000),
});

/** A surface as it is drawn: dry asphalt until somebody states its friction. `place`: which of the surfaces it becomes, from 0. */
export const defaultSurface = (place: number, outline: [number, number][]): Surface => ({
  name: `Surface ${place + 1}`,
  outline,
  friction: normal(0.74, 0.06),
});

/** Half the length and width of a surface that is added without drawing, m. */
const PATCH = { length: 3, width: 2 };

/** A rectangle about a place (m), to begin with. */
export const patchAbout = (x: number, y: number): [number, number][] => [
  [x - PATCH.length, y - PATCH.width],
  [x + PATCH.length, y - PATCH.width],
  [x + PATCH.length, y + PATCH.width],
  [x - PATCH.length, y + PATCH.width],
];

/** A slope to begin with: level, rising along +x. */
export const LEVEL_SLOPE = { grade: normal(0, 0.003), uphill: normal(0, 5) };

/** The value that a quantity starts from when it is added to a case (SI, deg). */
export function startingQuantity(path: string): Quantity {
  const key = path.slice(path.lastIndexOf('.') + 1);
  if (path === 'pulse') return rectangular(0.12, 0.08, 0.15);
  const table: Record<string, Quantity> = {
    restitution: normal(0.3, 0.1),
    impulseRatio: normal(0, 0.1),
    friction: normal(0.45, 0.12),
    slide: normal(0.1, 0.05),
    direction: normal(0, 4),
    speed: normal(5, 1),
    yawRate: normal(0, 10),
    onset: rectangular(0.5, 0, 1),
    slip: normal(0, 1),
    yawInertia: normal(2200, 160),
    forward: normal(0, 0.5),
    left: normal(0, 0.5),
  };
  return table[key] ?? fixed(0);
}

/** A new board: two default cars standing nose to nose, nothing known yet. Valid as a file; the methods say what they need. */
export function emptyCase(title = 'Untitled case'): CaseFile {
  return {
    format: 'retrodict-case',
    version: 1,
    title,
    reference: '',
    notes: '',
    display: { units: 'metric', paper: 'A4' },
    vehicles: { A: defaultVehicle('Vehicle A'), B: defaultVehicle('Vehicle B') },
    impact: {
      A: defaultPose(-2.2, 0),
      B: defaultPose(2.2, 180),
      point: { x: normal(0, 0.1), y: normal(0, 0.1) },
      plane: normal(90, 5),
      restitution: null,
      impulseRatio: null,
      friction: null,
    },
    approach: {
      A: { direction: null, speed: null, yawRate: fixed(0) },
      B: { direction: null, speed: null, yawRate: fixed(0) },
    },
    departure: { A: null, B: null },
    pulse: null,
    scene: { background: null, surfaces: [], marks: [], north: 90 },
    analysis: { method: 'directions', draws: DEFAULT_DRAWS, seed: DEFAULT_SEED, coverage: DEFAULT_COVERAGE },
  };
}
