import { type Vec, add, fromBody, scale, unit } from '@/lib/geometry/vector';
import { outlineOf } from '@/lib/geometry/polygon';
import type { Bounds } from './view';
import { boundsOf } from './view';

/** What the board shows, in world metres and radians: plain data that knows neither forms nor pixels. */
export type Which = 'A' | 'B';

/** Computed approach speeds, m/s, where there is an answer. */
export type Speeds = Partial<Record<Which, number>>;

export interface ScenePose {
  x: number;
  y: number;
  heading: number;
}

export interface SceneVehicle {
  which: Which;
  name: string;
  pose: ScenePose;
  body: {
    length: number;
    width: number;
    frontOverhang: number;
    wheelbase: number;
    track: number;
    frontAxleToMassCentre: number;
  };
}

/** A direction with the half width of its fan (two standard uncertainties). */
export interface SceneDirection {
  angle: number;
  fan: number;
}

export interface SceneTravel {
  direction: SceneDirection;
  legs: number[];
}

/** A stretch of ground with a friction of its own; of overlapping ones the last counts. */
export interface SceneSurface {
  name: string;
  friction: number;
  outline: Vec[];
}

export interface SceneWheels {
  each: { braking: number; steer: number }[];
  /** Whether each is set for itself. */
  apart: boolean;
}

export interface Scene {
  vehicles: Record<Which, SceneVehicle>;
  point: { at: Vec; spread: Vec };
  /** Direction of the contact plane and of its normal from A into B. */
  plane: { angle: number; fan: number; normal: number };
  approach: Record<Which, SceneDirection | null>;
  travel: Record<Which, SceneTravel | null>;
  /** Where a vehicle is known to have come to rest, when its travel is not given by legs. */
  rest: Record<Which, ScenePose | null>;
  /** How the wheels are set, in the order of `wheelsOf`, where the travel is simulated. */
  wheels: Record<Which, SceneWheels | null>;
  /** The vehicle whose wheels can be taken hold of. */
  open: Which | null;
  surfaces: SceneSurface[];
  marks: { label: string; points: Vec[] }[];
  north: number;
}

/** The scene with directions of approach that were computed in place of those that are not known. */
export function withComputed(scene: Scene, directions: Partial<Record<Which, SceneDirection>>): Scene {
  const { A, B } = scene.approach;
  return { ...scene, approach: { A: A ?? directions.A ?? null, B: B ?? directions.B ?? null } };
}

export const outlineAt = (vehicle: SceneVehicle, pose: ScenePose = vehicle.pose): Vec[] =>
  outlineOf(vehicle.body, [pose.x, pose.y], unit(pose.heading)).map(([x, y]): Vec => [x, y]);

/** Distance from the mass centre to the nose, m. */
export const noseOf = ({ body }: SceneVehicle): number => body.frontAxleToMassCentre + body.frontOverhang;

/** Where the wheels stand, in vehicle axes. */
export function wheelsOf({ body }: SceneVehicle): Vec[] {
  const [front, rear] = [body.frontAxleToMassCentre, body.frontAxleToMassCentre - body.wheelbase];
  const half = body.track / 2;
  return [
    [front, half],
    [front, -half],
    [rear, half],
    [rear, -half],
  ];
}

/** Where the wheels stand in the world. */
export const wheelPlaces = (vehicle: SceneVehicle): Vec[] =>
  wheelsOf(vehicle).map((wheel) => fromBody(wheel, vehicle.pose));

export const centreOf = (vehicle: SceneVehicle): Vec => [vehicle.pose.x, vehicle.pose.y];

/** The points between which the legs run, from the mass centre at contact to the end of the travel. */
export function pathOf(scene: Scene, which: Which): Vec[] {
  const travel = scene.travel[which];
  const start = centreOf(scene.vehicles[which]);
  if (!travel) return [start];
  let done = 0;
  return [start, ...travel.legs.map((leg) => add(start, scale(unit(travel.direction.angle), (done += leg))))];
}

/** The pose at rest: as known, or the end of the legs with the heading at contact, since legs say how far, not how it turned. */
export function restPose(scene: Scene, which: Which): ScenePose | null {
  if (!scene.travel[which]) return scene.rest[which];
  const [x, y] = pathOf(scene, which).at(-1) as Vec;
  return { x, y, heading: scene.vehicles[which].pose.heading };
}

/** From the mass centre to just behind the tail, m. */
const tailReach = (vehicle: SceneVehicle): number => vehicle.body.length - noseOf(vehicle) + 0.15;

/** Length of the approach arrow, m: what is covered in a third of a second at the computed speed, within what fits. */
const arrowLength = (speed: number | undefined): number =>
  speed === undefined ? 2 : Math.min(4, Math.max(1.2, speed / 3));

/** Where the approach arrow begins. */
export function approachTail(scene: Scene, which: Which, speed: number | undefined): Vec | null {
  const direction = scene.approach[which];
  const vehicle = scene.vehicles[which];
  return direction && add(centreOf(vehicle), scale(unit(direction.angle), -tailReach(vehicle) - arrowLength(speed)));
}

/** Room to draw in, to either side of the contact point, m. */
const ROOM: Vec = [7, 5];

/** Where the approach arrow arrives: behind the tail. */
export function approachTip(scene: Scene, which: Which): Vec | null {
  const direction = scene.approach[which];
  const vehicle = scene.vehicles[which];
  return direction && add(centreOf(vehicle), scale(unit(direction.angle), -tailReach(vehicle)));
}

/** All that a view should show. */
export function sceneBounds(scene: Scene): Bounds {
  const points = (['A', 'B'] as const).flatMap((which): Vec[] => {
    const vehicle = scene.vehicles[which];
    const rest = restPose(scene, which);
    const tail = approachTail(scene, which, undefined);
    return [
      ...outlineAt(vehicle),
      fromBody([noseOf(vehicle) + 1, 0], vehicle.pose),
      ...(rest ? outlineAt(vehicle, rest) : []),
      ...(tail ? [tail] : []),
    ];
  });
  return boundsOf([...points, add(scene.point.at, ROOM), add(scene.point.at, scale(ROOM, -1))]);
}
