import { type Vec, toRadians } from '@/lib/geometry/vector';
import type {
  Scene,
  SceneDirection,
  ScenePose,
  SceneTravel,
  SceneVehicle,
  SceneWheels,
  Which,
} from '@/lib/scene/scene';
import type { CaseFile, Quantity } from './schema';
import { WHEELS, wheelsApart } from './wheels';

/** Standard uncertainty that a quantity states, in its own unit. */
function uncertaintyOf({ value, spread }: Quantity): number {
  if (!spread || spread.shape === 'fixed') return 0;
  if (spread.shape === 'normal') return spread.sd;
  const { low, high } = spread;
  if (spread.shape === 'rectangular') return (high - low) / Math.sqrt(12);
  return Math.sqrt((low * low + high * high + value * value - low * high - low * value - high * value) / 18);
}

const direction = (q: Quantity): SceneDirection => ({
  angle: toRadians(q.value),
  fan: toRadians(2 * uncertaintyOf(q)),
});

function vehicleOf({ vehicles, impact }: CaseFile, which: Which): SceneVehicle {
  const { name, length, width, wheelbase, track, frontOverhang, frontAxleToMassCentre } = vehicles[which];
  const { x, y, heading } = impact[which];
  return {
    which,
    name,
    pose: { x: x.value, y: y.value, heading: toRadians(heading.value) },
    body: { length, width, frontOverhang, wheelbase, track, frontAxleToMassCentre: frontAxleToMassCentre.value },
  };
}

function travelOf({ departure }: CaseFile, which: Which): SceneTravel | null {
  const stated = departure[which];
  if (stated?.kind !== 'legs') return null;
  return { direction: direction(stated.direction), legs: stated.legs.map(({ distance }) => distance.value) };
}

function restOf({ departure }: CaseFile, which: Which): ScenePose | null {
  const stated = departure[which];
  if (stated?.kind !== 'spin') return null;
  const { x, y, heading } = stated.rest;
  return x && y && heading ? { x: x.value, y: y.value, heading: toRadians(heading.value) } : null;
}

function wheelsOf({ departure }: CaseFile, which: Which): SceneWheels | null {
  const stated = departure[which];
  if (stated?.kind !== 'spin') return null;
  const wheels = wheelsApart(stated.wheels);
  const each = WHEELS.map(({ id }) => ({
    braking: wheels[id].braking.value,
    steer: toRadians(wheels[id].steer.value),
  }));
  return { each, apart: !('all' in stated.wheels) };
}

/** The angle of the normal from A into B. */
function normalOf(plane: number, a: SceneVehicle, b: SceneVehicle): number {
  const normal: Vec = [Math.sin(plane), -Math.cos(plane)];
  const towards = normal[0] * (b.pose.x - a.pose.x) + normal[1] * (b.pose.y - a.pose.y);
  return Math.atan2(normal[1], normal[0]) + (towards < 0 ? Math.PI : 0);
}

/** What the board shows of a case. */
export function sceneOf(casefile: CaseFile): Scene {
  const { impact, approach, scene } = casefile;
  const vehicles = { A: vehicleOf(casefile, 'A'), B: vehicleOf(casefile, 'B') };
  const plane = direction(impact.plane);
  const each = <T>(of: (which: Which) => T): Record<Which, T> => ({ A: of('A'), B: of('B') });
  return {
    vehicles,
    point: {
      at: [impact.point.x.value, impact.point.y.value],
      spread: [2 * uncertaintyOf(impact.point.x), 2 * uncertaintyOf(impact.point.y)],
    },
    plane: { ...plane, normal: normalOf(plane.angle, vehicles.A, vehicles.B) },
    approach: each((which) => {
      const stated = approach[which].direction;
      return stated ? direction(stated) : null;
    }),
    travel: each((which) => travelOf(casefile, which)),
    rest: each((which) => restOf(casefile, which)),
    wheels: each((which) => wheelsOf(casefile, which)),
    open: null,
    surfaces: (scene?.surfaces ?? []).map(({ name, friction, outline }) => ({
      name,
      friction: friction.value,
      outline: outline.map(([x, y]): Vec => [x, y]),
    })),
    marks: (scene?.marks ?? []).map(({ label, points }) => ({ label, points: points.map(([x, y]): Vec => [x, y]) })),
    north: toRadians(scene?.north ?? 90),
  };
}
