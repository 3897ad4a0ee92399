import { distanceOutside } from '@/lib/geometry/polygon';
import { type Vec, add, angleOf, distance, fromBody, scale, subtract, unit } from '@/lib/geometry/vector';
import { type Scene, type Which, approachTail, centreOf, noseOf, outlineAt, pathOf } from './scene';

/** What can be taken hold of on the board, and where. */
export type Grip =
  | { part: 'vehicle'; which: Which }
  | { part: 'turn'; which: Which }
  | { part: 'point' }
  | { part: 'plane' }
  | { part: 'approach'; which: Which }
  | { part: 'joint'; which: Which; leg: number }
  | { part: 'end'; which: Which };

/** Beyond the nose, m. */
const TURN_REACH = 0.9;
/** From the contact point to the handle of the plane, m. */
export const PLANE_REACH = 1.6;

export const turnHandle = (scene: Scene, which: Which): Vec => {
  const vehicle = scene.vehicles[which];
  return fromBody([noseOf(vehicle) + TURN_REACH, 0], vehicle.pose);
};

export const planeHandle = ({ point, plane }: Scene): Vec => add(point.at, scale(unit(plane.angle), PLANE_REACH));

interface Handle {
  grip: Grip;
  at: Vec;
}

/** The handles of a scene; small things before what they lie on. `speeds`: computed approach speeds, for the arrows. */
export function handlesOf(scene: Scene, speeds: Partial<Record<Which, number>>): Handle[] {
  const each = (['A', 'B'] as const).flatMap((which): Handle[] => {
    const tail = approachTail(scene, which, speeds[which]);
    const path = pathOf(scene, which);
    const legs = path.slice(1);
    return [
      { grip: { part: 'turn', which }, at: turnHandle(scene, which) },
      ...(tail ? [{ grip: { part: 'approach', which } as const, at: tail }] : []),
      ...legs.map((at, k): Handle => ({
        grip: k === legs.length - 1 ? { part: 'end', which } : { part: 'joint', which, leg: k },
        at,
      })),
    ];
  });
  return [
    { grip: { part: 'point' }, at: scene.point.at },
    { grip: { part: 'plane' }, at: planeHandle(scene) },
    ...each,
  ];
}

/** What lies under a point: the nearest handle within `reach` (m), else a vehicle, else nothing. */
export function gripAt(scene: Scene, speeds: Partial<Record<Which, number>>, at: Vec, reach: number): Grip | null {
  const near = handlesOf(scene, speeds)
    .map((handle) => ({ ...handle, off: distance(handle.at, at) }))
    .filter(({ off }) => off <= reach)
    .sort((p, q) => p.off - q.off)[0];
  if (near) return near.grip;
  const which = vehicleAt(scene, at);
  if (which) return { part: 'vehicle', which };
  return nearPlane(scene, at, reach / 2) ? { part: 'plane' } : null;
}

/** The vehicle whose outline holds a point; of two, the one whose centre is nearer. */
export function vehicleAt(scene: Scene, at: Vec): Which | null {
  const holding = (['A', 'B'] as const).filter((which) => distanceOutside(at, outlineAt(scene.vehicles[which])) <= 0);
  return (
    holding.sort((p, q) => distance(centreOf(scene.vehicles[p]), at) - distance(centreOf(scene.vehicles[q]), at))[0] ??
    null
  );
}

function nearPlane({ point, plane }: Scene, at: Vec, reach: number): boolean {
  const off = subtract(at, point.at);
  const turned = angleOf(off) - plane.angle;
  const size = distance(at, point.at);
  return Math.abs(size * Math.sin(turned)) <= reach && Math.abs(size * Math.cos(turned)) <= PLANE_REACH;
}
