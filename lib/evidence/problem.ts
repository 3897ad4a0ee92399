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
  /** The measured rest pose, where the travel is worked backwards; null in a fit, which runs it forward. */
  rest: { x: Slot; y: Slot; heading: Slot } | null;
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

/** Travel that is evidence of a fit: what its wheels do while a contact lasts. */
export interface ObservedSlots {
  kind: 'observed';
  friction: Slot;
  share: Slot;
}

/** What a fit sets beyond the vehicles, and what it is held against. */
export interface FitSlots {
  speed: Record<VehicleId, Slot>;
  /** The direction of approach, or where `fromHeading` the slip that is added to the heading. */
  direction: Record<VehicleId, { slot: Slot; fromHeading: boolean }>;
  restitution: Slot;
  friction: Slot;
  observations: Observation[];
}

/** One piece of evidence: what it is of, its mean and standard uncertainty in SI and radians. */
export interface Observation {
  path: string;
  of: Observed;
  value: number;
  sd: number;
}

export type Observed =
  | `${VehicleId}.${'departureSpeed' | 'departureDirection' | 'departureYawRate' | 'deltaVForward' | 'deltaVLeft'}`
  | `${VehicleId}.${'restX' | 'restY' | 'restHeading'}`
  | `offset.${'x' | 'y' | 'heading'}`
  | 'slide'
  | 'energyLost'
  /** An upper limit: no residual depth on either vehicle. */
  | 'energyBelow';

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
  departure: LegsSlots | SpinSlots | ObservedSlots;
  /** null without any residual depth: that bounds the energy from above and gives no estimate. */
  damage: DamageSlots | null;
}

/** A contact of finite duration: who carries the contact line. */
export interface LastingSlots {
  lineOn: VehicleId;
  /** s */
  pulse: Slot;
}

export interface Problem {
  method: Method;
  /** null: the impact is worked backwards. */
  fit: FitSlots | null;
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
