import type { CaseFile, VehicleId } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import { sceneOf } from '@/lib/casefile/scene-of';
import type { Travels } from '@/lib/geometry/timed-path';
import type { Result } from '@/lib/results/result';
import { type Scene, type SceneVehicle, centreOf, noseOf, outlineAt, pathOf, wheelsOf } from '@/lib/scene/scene';
import type { UnitSystem } from '@/lib/units/dimension';
import { formatWithUnit } from '@/lib/units/format';
import { unitsOf } from './numbers';
import type { Item, Point } from './plan-sheet';
import { radians } from './worked/vector';

/** How wheels, arrows and the contact line are drawn, m. */
const WHEEL = { length: 0.6, width: 0.2 };
const ARROW = 2.5;
const PLANE_HALF = 1.6;
const NORMAL = 1.1;
/** How far the nose mark reaches back, m. */
const NOSE = 0.5;
/** How far the length of a leg stands off its line, m; beside the vehicle where the line still runs under it. */
const BESIDE = 0.3;
/** An approach found slower than this has no arrow, m/s. */
const SLOW = 0.3;

/** What the plan shows of a case, in world metres, y up; drawn in this order. */
export function planItems(casefile: CaseFile, result: Result, travels: Travels): Item[] {
  const scene = sceneOf(casefile);
  const marks = scene.marks.map(({ points, label }): Item => ({ kind: 'line', role: 'mark', points, label }));
  return [
    ...marks,
    ...VEHICLE_IDS.flatMap((id) => vehicleItems(scene.vehicles[id])),
    ...VEHICLE_IDS.map((id) => letterItem(scene, id)),
    ...VEHICLE_IDS.flatMap((id) => restItems(scene, id)),
    ...VEHICLE_IDS.flatMap((id) => travelItems(scene, id, unitsOf(casefile))),
    ...VEHICLE_IDS.flatMap((id) => courseItems(travels, id)),
    ...VEHICLE_IDS.flatMap((id) => approachItems(scene, result, id)),
    ...contactItems(scene),
  ];
}

/** The point at a distance from another, in a direction (rad). */
const towards = ([x, y]: Point, angle: number, distance: number): Point => [
  x + distance * Math.cos(angle),
  y + distance * Math.sin(angle),
];

/** A point given in vehicle axes. */
const onVehicle = (vehicle: SceneVehicle, forward: number, left: number): Point =>
  towards(towards(centreOf(vehicle), vehicle.pose.heading, forward), vehicle.pose.heading + Math.PI / 2, left);

function vehicleItems(vehicle: SceneVehicle): Item[] {
  const [nose, half] = [noseOf(vehicle), vehicle.body.width / 2];
  const wheel = ([x, y]: Point): Point[] =>
    [
      [1, 1],
      [-1, 1],
      [-1, -1],
      [1, -1],
    ].map(([along, across]) => onVehicle(vehicle, x + (along * WHEEL.length) / 2, y + (across * WHEEL.width) / 2));
  return [
    { kind: 'polygon', role: `vehicle.${vehicle.which}`, points: outlineAt(vehicle) },
    ...wheelsOf(vehicle).map((at): Item => ({ kind: 'polygon', role: 'detail', points: wheel(at) })),
    {
      kind: 'line',
      role: 'detail',
      points: [
        onVehicle(vehicle, nose - NOSE, half),
        onVehicle(vehicle, nose, 0),
        onVehicle(vehicle, nose - NOSE, -half),
      ],
    },
    { kind: 'dot', role: 'centre', at: centreOf(vehicle) },
  ];
}

/** The letter of a vehicle, at the end that is farther from the contact point. */
function letterItem({ vehicles, point }: Scene, id: VehicleId): Item {
  const vehicle = vehicles[id];
  const [nose, tail] = [noseOf(vehicle), noseOf(vehicle) - vehicle.body.length];
  const [dx, dy] = [point.at[0] - vehicle.pose.x, point.at[1] - vehicle.pose.y];
  const forward = dx * Math.cos(vehicle.pose.heading) + dy * Math.sin(vehicle.pose.heading);
  const at = forward > (nose + tail) / 2 ? tail + 0.9 : nose - 1.1;
  return { kind: 'label', at: onVehicle(vehicle, at, 0), text: id, strong: true };
}

/** A measured rest pose: its outline in the manner of the travel, named. */
function restItems(scene: Scene, id: VehicleId): Item[] {
  const rest = scene.rest[id];
  if (!rest) return [];
  const outline = outlineAt(scene.vehicles[id], rest);
  return [
    { kind: 'line', role: `travel.${id}`, points: [...outline, outline[0]].map(([x, y]): Point => [x, y]) },
    {
      kind: 'label',
      at: towards([rest.x, rest.y], rest.heading, noseOf(scene.vehicles[id]) + BESIDE),
      text: `${id} at rest`,
    },
  ];
}

/** The simulated path of the mass centre. */
function courseItems(travels: Travels, id: VehicleId): Item[] {
  const points = travels[id]?.poses.map(({ x, y }): Point => [x, y]) ?? [];
  return points.length > 1 ? [{ kind: 'line', role: `travel.${id}`, points }] : [];
}

function travelItems(scene: Scene, id: VehicleId, units: UnitSystem): Item[] {
  const travel = scene.travel[id];
  const path = pathOf(scene, id);
  if (!travel) return [];
  return travel.legs.flatMap((distance, k): Item[] => [
    { kind: 'line', role: `travel.${id}`, points: [path[k], path[k + 1]], arrow: true },
    {
      kind: 'label',
      at: besideLeg(scene.vehicles[id], path[k], path[k + 1], travel.direction.angle),
      text: formatWithUnit(distance, 'length', units, { decimals: 2 }),
    },
  ]);
}

function besideLeg(vehicle: SceneVehicle, from: Point, to: Point, angle: number): Point {
  const middle: Point = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2];
  const [x, y] = centreOf(vehicle);
  const isClear = Math.hypot(middle[0] - x, middle[1] - y) > vehicle.body.length / 2;
  return towards(middle, angle + Math.PI / 2, BESIDE + (isClear ? 0 : vehicle.body.width / 2));
}

/** The direction of approach: as stated, or as found where the method answers it. */
function approachItems(scene: Scene, result: Result, id: VehicleId): Item[] {
  const speed = result.central[`${id}.approachSpeed`] ?? 0;
  const found = speed < SLOW ? undefined : result.central[`${id}.approachDirection`];
  const angle = scene.approach[id]?.angle ?? (found === undefined ? undefined : radians(found));
  if (angle === undefined) return [];
  const vehicle = scene.vehicles[id];
  const head = towards(centreOf(vehicle), angle, noseOf(vehicle) - vehicle.body.length - BESIDE);
  return [{ kind: 'line', role: `approach.${id}`, points: [towards(head, angle, -ARROW), head], arrow: true }];
}

function contactItems({ point: { at }, plane }: Scene): Item[] {
  return [
    {
      kind: 'line',
      role: 'plane',
      points: [towards(at, plane.angle, -PLANE_HALF), towards(at, plane.angle, PLANE_HALF)],
    },
    { kind: 'line', role: 'normal', points: [at, towards(at, plane.normal, NORMAL)], arrow: true },
    { kind: 'dot', role: 'point', at },
  ];
}
