import { distanceOutside, holds } from '@/lib/geometry/polygon';
import { distanceToSegment } from '@/lib/geometry/segment';
import { type Vec, add, distance, fromBody, scale, subtract, unit } from '@/lib/geometry/vector';
import {
  type Scene,
  type Speeds,
  type Which,
  approachTail,
  approachTip,
  centreOf,
  noseOf,
  outlineAt,
  pathOf,
  wheelPlaces,
} from './scene';
import { surfacePlace } from './labels';

/** What can be taken hold of on the board, and where. */
export type Grip =
  | { part: 'vehicle'; which: Which }
  | { part: 'turn'; which: Which }
  | { part: 'point' }
  | { part: 'plane' }
  | { part: 'approach'; which: Which }
  /** Between two legs. */
  | { part: 'joint'; which: Which; leg: number }
  | { part: 'end'; which: Which }
  /** The line of a leg itself. */
  | { part: 'leg'; which: Which; leg: number }
  /** A known rest pose. */
  | { part: 'rest'; which: Which }
  | { part: 'restTurn'; which: Which }
  | { part: 'mark'; index: number }
  /** A wheel of the open vehicle, and the handle that steers it. */
  | { part: 'wheel'; which: Which; wheel: number }
  | { part: 'steer'; which: Which; wheel: number }
  /** A surface as a whole. */
  | { part: 'surface'; index: number }
  | { part: 'corner'; index: number; corner: number };

const BOTH = ['A', 'B'] as const;
/** Beyond the nose, m. */
const TURN_REACH = 0.9;
/** From the middle of a wheel to the handle that steers it, and how far around it counts as on it, m. */
const STEER_REACH = 0.6;
const WHEEL_REACH = 0.32;
/** From the contact point to the handle of the plane, m. */
export const PLANE_REACH = 1.6;

export const turnHandle = (scene: Scene, which: Which): Vec => {
  const vehicle = scene.vehicles[which];
  return fromBody([noseOf(vehicle) + TURN_REACH, 0], vehicle.pose);
};

export const planeHandle = ({ point, plane }: Scene): Vec => add(point.at, scale(unit(plane.angle), PLANE_REACH));

export interface Handle {
  grip: Grip;
  at: Vec;
}

/** The handles of a scene; small things before what they lie on. */
export function handlesOf(scene: Scene, speeds: Speeds): Handle[] {
  return [
    { grip: { part: 'point' }, at: scene.point.at },
    { grip: { part: 'plane' }, at: planeHandle(scene) },
    ...BOTH.flatMap((which) => handlesOfVehicle(scene, which, speeds[which])),
    ...(scene.open ? steerHandles(scene, scene.open) : []),
    ...scene.surfaces.flatMap((_, index) => handlesOfSurface(scene, index)),
  ];
}

/** Ahead of each wheel, where they are set one by one. */
function steerHandles({ vehicles, wheels }: Scene, which: Which): Handle[] {
  const { pose } = vehicles[which];
  if (!wheels[which]?.apart) return [];
  const places = wheelPlaces(vehicles[which]);
  return wheels[which].each.map(({ steer }, wheel) => ({
    grip: { part: 'steer', which, wheel },
    at: add(places[wheel], scale(unit(pose.heading + steer), STEER_REACH)),
  }));
}

/** The wheel of the open vehicle under a point. */
function wheelAt({ vehicles, wheels, open }: Scene, at: Vec): Grip | null {
  if (!open || !wheels[open]?.apart) return null;
  const off = wheelPlaces(vehicles[open]).map((centre) => distance(centre, at));
  const wheel = off.indexOf(Math.min(...off));
  return off[wheel] <= WHEEL_REACH ? { part: 'wheel', which: open, wheel } : null;
}

/** A handle at each corner, and one inside that moves the whole. */
function handlesOfSurface(scene: Scene, index: number): Handle[] {
  const { outline } = scene.surfaces[index];
  return [
    ...outline.map((at, corner): Handle => ({ grip: { part: 'corner', index, corner }, at })),
    { grip: { part: 'surface', index }, at: surfacePlace(scene, index) },
  ];
}

/** The surface under a point; of several the one that counts. */
export function surfaceAt({ surfaces }: Scene, at: Vec): number | null {
  const index = surfaces.findLastIndex(({ outline }) => holds(outline, at));
  return index < 0 ? null : index;
}

function handlesOfVehicle(scene: Scene, which: Which, speed: number | undefined): Handle[] {
  const tail = approachTail(scene, which, speed);
  const ends = pathOf(scene, which).slice(1);
  const rest = scene.travel[which] ? null : scene.rest[which];
  const ahead: Vec = [noseOf(scene.vehicles[which]) + TURN_REACH, 0];
  return [
    { grip: { part: 'turn', which }, at: turnHandle(scene, which) },
    ...(tail ? [{ grip: { part: 'approach', which } as const, at: tail }] : []),
    ...ends.map((at, leg): Handle => ({
      grip: leg === ends.length - 1 ? { part: 'end', which } : { part: 'joint', which, leg },
      at,
    })),
    ...(rest
      ? [
          { grip: { part: 'rest', which } as const, at: [rest.x, rest.y] as Vec },
          { grip: { part: 'restTurn', which } as const, at: fromBody(ahead, rest) },
        ]
      : []),
  ];
}

export const isSameGrip = (a: Grip | null, b: Grip | null): boolean => JSON.stringify(a) === JSON.stringify(b);

/** What lies under a point: the nearest handle within `reach` (m), else a vehicle, else the nearest line, else nothing. */
export function gripAt(scene: Scene, speeds: Speeds, at: Vec, reach: number): Grip | null {
  const near = nearest(
    handlesOf(scene, speeds).map(({ grip, at: handle }) => ({ grip, off: distance(handle, at) })),
    reach,
  );
  if (near) return near;
  const wheel = wheelAt(scene, at);
  if (wheel) return wheel;
  const which = vehicleAt(scene, at);
  if (which) return { part: 'vehicle', which };
  return nearest(
    linesOf(scene, speeds).map(({ grip, points }) => ({ grip, off: offLine(at, points) })),
    reach / 2,
  );
}

function nearest(found: { grip: Grip; off: number }[], reach: number): Grip | null {
  return found.filter(({ off }) => off <= reach).sort((p, q) => p.off - q.off)[0]?.grip ?? null;
}

/** The vehicle whose outline holds a point; of two, the one whose centre is nearer. */
export function vehicleAt(scene: Scene, at: Vec): Which | null {
  const holding = BOTH.filter((which) => distanceOutside(at, outlineAt(scene.vehicles[which])) <= 0);
  const off = (which: Which): number => distance(centreOf(scene.vehicles[which]), at);
  return holding.sort((p, q) => off(p) - off(q))[0] ?? null;
}

interface Line {
  grip: Grip;
  points: readonly Vec[];
}

/** What is drawn as a line and can be taken hold of anywhere along it. */
function linesOf(scene: Scene, speeds: Speeds): Line[] {
  const { point, plane } = scene;
  const half = scale(unit(plane.angle), PLANE_REACH);
  return [
    { grip: { part: 'plane' }, points: [subtract(point.at, half), add(point.at, half)] },
    ...BOTH.flatMap((which): Line[] => {
      const [tail, tip] = [approachTail(scene, which, speeds[which]), approachTip(scene, which)];
      const path = pathOf(scene, which);
      return [
        ...(tail && tip ? [{ grip: { part: 'approach', which } as const, points: [tail, tip] }] : []),
        ...path.slice(1).map((to, leg): Line => ({ grip: { part: 'leg', which, leg }, points: [path[leg], to] })),
      ];
    }),
    ...scene.marks.map(({ points }, index): Line => ({ grip: { part: 'mark', index }, points })),
    ...scene.surfaces.map(({ outline }, index): Line => ({
      grip: { part: 'surface', index },
      points: [...outline, outline[0]],
    })),
  ];
}

/** Distance from a point to a line of one or more points, m. */
function offLine(at: Vec, points: readonly Vec[]): number {
  if (points.length === 1) return distance(at, points[0]);
  return Math.min(...points.slice(1).map((to, k) => distanceToSegment(at, points[k], to)));
}
