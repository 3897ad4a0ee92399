import type { ThingId } from '@/lib/casefile/fields';
import { WHEELS } from '@/lib/casefile/wheels';
import { type Vec, fromBody } from '@/lib/geometry/vector';
import { type Scene, type Speeds, type Which, approachTail, noseOf, pathOf, wheelPlaces } from '@/lib/scene/scene';

/** The place in the world, m, that the numbers of a thing stand beside. */
export function placeOf(scene: Scene, thing: ThingId, speeds: Speeds): Vec {
  const [kind, which, k] = thing.split('.') as [string, Which, string?];
  if (kind === 'vehicle') return fromBody([noseOf(scene.vehicles[which]) + 0.9, 0], scene.vehicles[which].pose);
  if (kind === 'approach') return approachTail(scene, which, speeds[which]) ?? scene.point.at;
  if (kind === 'wheel') {
    const wheel = WHEELS.findIndex(({ id }) => id === k);
    return wheelPlaces(scene.vehicles[which])[wheel] ?? scene.point.at;
  }
  const rest = kind === 'rest' ? scene.rest[which] : null;
  if (rest) return [rest.x, rest.y];
  if (kind === 'departure' || kind === 'rest') return pathOf(scene, which).at(-1) ?? scene.point.at;
  if (kind === 'leg') return pathOf(scene, which)[Number(k) + 1] ?? scene.point.at;
  if (kind === 'surface') return scene.surfaces[Number(which)]?.outline[0] ?? scene.point.at;
  return scene.point.at;
}
