import { distanceOutside, holds } from '@/lib/geometry/polygon';
import { type Vec, add, fromBody, scale, unit } from '@/lib/geometry/vector';
import { insideOf } from './inside';
import { type Scene, type Which, centreOf, noseOf, outlineAt, pathOf, restPose, wheelsOf } from './scene';

/**
 * Where words stand so that they cover as little as can be, in world metres. `off`: how far they stand off what they
 * name, m; it depends on the zoom.
 */

/** How far a point is from the nearest vehicle at contact; negative inside one. */
const clearance = (scene: Scene, at: Vec): number =>
  Math.min(...(['A', 'B'] as const).map((which) => distanceOutside(at, outlineAt(scene.vehicles[which]))));

/** The clearest of some places; an earlier one where several are clear enough. */
function clearest(scene: Scene, places: readonly Vec[], enough: number): Vec {
  const rated = places.map((at) => ({ at, clear: Math.min(enough, clearance(scene, at)) }));
  return rated.reduce((best, next) => (next.clear > best.clear + 1e-9 ? next : best)).at;
}

/** Outside the middle of a side of the vehicle at rest, best ahead of it. `half`: half the width and height of the words, m. */
export function restLabelAt(scene: Scene, which: Which, half: Vec): Vec | null {
  const rest = restPose(scene, which);
  if (!rest) return null;
  const vehicle = scene.vehicles[which];
  const { length, width } = vehicle.body;
  const nose = noseOf(vehicle);
  const middle = nose - length / 2;
  const places = [0, 1, 3, 2].map((quarter) => {
    const away = unit(rest.heading + (quarter * Math.PI) / 2);
    const off = Math.abs(away[0]) * half[0] + Math.abs(away[1]) * half[1];
    const side = quarter % 2 === 0 ? length / 2 : width / 2;
    return add(fromBody([middle, 0], rest), scale(away, side + off));
  });
  return clearest(scene, places, half[1]);
}

/** Along a leg, in the order they are tried. */
const ALONG = [0.5, 0.7, 0.3, 0.85, 1];

/** Beside a leg, in its middle where that is free. */
export function legLabelAt(scene: Scene, which: Which, leg: number, off: number): Vec {
  const path = pathOf(scene, which);
  const [from, to] = [path[leg], path[leg + 1]];
  const across = unit((scene.travel[which]?.direction.angle ?? 0) + Math.PI / 2);
  const places = ALONG.flatMap((share) => {
    const on = add(scale(from, 1 - share), scale(to, share));
    return [add(on, scale(across, off)), add(on, scale(across, -off))];
  });
  return clearest(scene, places, off);
}

/** From a vehicle, at contact and at rest, to the handle and the name of the ground under it, m. */
const OFF_VEHICLES = 1.6;

/** Inside a surface, off the vehicles and off the surfaces over it where there is room: its handle, and its name below. */
export function surfacePlace(scene: Scene, index: number): Vec {
  const over = scene.surfaces.slice(index + 1).map(({ outline }) => outline);
  const bodies = (['A', 'B'] as const).flatMap((which) => {
    const rest = restPose(scene, which);
    return [outlineAt(scene.vehicles[which]), ...(rest ? [outlineAt(scene.vehicles[which], rest)] : [])];
  });
  return insideOf(
    scene.surfaces[index].outline,
    (at) =>
      bodies.every((body) => distanceOutside(at, body) > OFF_VEHICLES) && !over.some((outline) => holds(outline, at)),
  );
}

/** Half the width and height of the words about a wheel, pixels. */
export const WHEEL_WORDS: Vec = [40, 14];

/** Outside the vehicle, beside a wheel. `half`: half the width and height of the words, m. */
export function wheelLabelAt({ vehicles }: Scene, which: Which, wheel: number, half: Vec): Vec {
  const vehicle = vehicles[which];
  const [x, y] = wheelsOf(vehicle)[wheel];
  const side = Math.sign(y);
  const away = unit(vehicle.pose.heading + (side * Math.PI) / 2);
  const edge = fromBody([x, (side * vehicle.body.width) / 2], vehicle.pose);
  return add(edge, [away[0] * half[0], away[1] * half[1]]);
}

/** On the tail of a vehicle. */
export function letterAt(scene: Scene, which: Which): Vec {
  const vehicle = scene.vehicles[which];
  const back = noseOf(vehicle) - vehicle.body.length + Math.min(0.7, vehicle.body.length / 4);
  return add(centreOf(vehicle), scale(unit(vehicle.pose.heading), back));
}
