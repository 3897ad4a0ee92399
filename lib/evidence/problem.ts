import type { Method, VehicleId } from '@/lib/casefile/schema';
import type { DrawSpread, DrawSupport } from '@/lib/numerics/spread';

/**
 * The problem: what a method uses of a case, in SI and radians, as plain data that can be sent to a worker.
 * Every uncertain or fixed number is one input; the mechanical roles point at inputs by index.
 */
export interface Input {
  /** Dotted path in the case file; also the name of its random stream. */
  path: string;
  value: number;
  spread: DrawSpread;
  support: DrawSupport;
}

/** Index into Problem.inputs. */
export type Slot = number;

export interface LegSlots {
  distance: Slot;
  friction: Slot;
  share: Slot;
  grade: Slot;
}

export interface LegsSlots {
  kind: 'legs';
  direction: Slot;
  yawRate: Slot | null;
  endSpeed: Slot;
  legs: LegSlots[];
}

/** A velocity and a yaw rate at separation in the axes of the heading at contact, m/s and rad/s. */
export interface LocalSeparation {
  forward: number;
  left: number;
  w: number;
}

/** Where a search for a separation begins: the central one, and how it answers to the rest pose. */
export interface SpinStart extends LocalSeparation {
  /** Way and turn from first touch to separation in the axes of the heading at first touch, m and rad: 0 in an instant. */
  carried: [number, number, number];
  /** Rest less contact of the central values: m in the axes of the heading at contact, and the turn, rad. */
  reach: [number, number, number];
  /** Change of (forward, left, w) with the reach: the inverse of the Jacobian of the simulation, by rows. */
  inverse: number[][];
  /** Friction and mean braking share of the central values, and the change of (forward, left, w) with a relative change of each. */
  friction: number;
  braking: number;
  byFriction: number[];
  byBraking: number[];
}

/** Travel simulated to rest. */
export interface SpinSlots {
  kind: 'spin';
  restX: Slot;
  restY: Slot;
  restHeading: Slot;
  friction: Slot;
  onset: Slot | null;
  grade: Slot | null;
  uphill: Slot | null;
  /** Front left, front right, rear left, rear right; one slot may serve all. */
  braking: Slot[];
  steer: (Slot | null)[];
  surfaces: { outline: [number, number][]; friction: Slot }[];
  /** Filled in once the central values are solved. */
  start: SpinStart | null;
}

/** Residual crush of one vehicle. */
export interface DamageSlots {
  depths: Slot[];
  /** Widths of the strips between the depths, as shares of the damaged width. */
  strips: number[];
  width: Slot;
  forceAngle: Slot;
  a: Slot;
  b: Slot;
}

export interface VehicleSlots {
  mass: Slot;
  /** The inertia itself, or the factor on the estimate when `inertiaEstimated`. */
  yawInertia: Slot;
  inertiaEstimated: boolean;
  frontAxleToMassCentre: Slot;
  /** m, fixed. */
  wheelbase: number;
  track: number;
  x: Slot;
  y: Slot;
  heading: Slot;
  /** Inputs of the method directions; results of the method restitution. */
  approachDirection: Slot | null;
  approachYawRate: Slot | null;
  departure: LegsSlots | SpinSlots;
  /** null without any residual depth: that bounds the energy from above and gives no estimate. */
  damage: DamageSlots | null;
}

/** The methods that this version solves. */
export type SolvedMethod = Exclude<Method, 'fit'>;

/** A contact of finite duration: who carries the contact line. */
export interface LastingSlots {
  lineOn: VehicleId;
  /** s */
  pulse: Slot;
}

export interface Problem {
  method: SolvedMethod;
  /** null: the impact is an instant. */
  lasting: LastingSlots | null;
  inputs: Input[];
  vehicles: Record<VehicleId, VehicleSlots>;
  pointX: Slot;
  pointY: Slot;
  plane: Slot;
  restitution: Slot | null;
  impulseRatio: Slot | null;
  pulse: Slot | null;
  /** Seat positions in vehicle axes from the mass centre, m. */
  seats: Record<VehicleId, { name: string; x: number; y: number }[]>;
  seed: number;
}
