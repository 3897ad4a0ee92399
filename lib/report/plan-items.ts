import type { CaseFile, LegsDeparture, Vehicle, VehicleId } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import { formatWithUnit } from '@/lib/units/format';
import { unitsOf } from './numbers';
import type { Item, Point } from './plan-sheet';
import { type Vector, dot, less, perp, scaled, size, sum, unit } from './worked/vector';

/** How a wheel, an arrow and the contact line are drawn, m. */
const WHEEL = { length: 0.6, width: 0.2 };
const ARROW = 2.5;
const PLANE_HALF = 1.6;
const NORMAL = 1.1;
/** An approach slower than this has no arrow, m/s. */
const SLOW = 0.3;

const at = (v: Vector): Point => [v.x, v.y];

interface Frame {
  centre: Vector;
  forward: Vector;
}

/** Body coordinates (forward, left) into the world. */
const placed = ({ centre, forward }: Frame, x: number, y: number): Point =>
  at(sum(centre, sum(scaled(forward, x), scaled(perp(forward), y))));

/** What the plan shows of a case, in world metres, y up; drawn in this order. */
export function planItems(casefile: CaseFile, result: Result): Item[] {
  const marks = (casefile.scene?.marks ?? []).map(({ points, label }): Item => ({
    kind: 'line',
    role: 'mark',
    points,
    label,
  }));
  return [
    ...marks,
    ...VEHICLE_IDS.flatMap((id) => vehicleItems(casefile.vehicles[id], frameOf(casefile, id), id)),
    ...VEHICLE_IDS.map((id) => letterItem(casefile, id)),
    ...VEHICLE_IDS.flatMap((id) => travelItems(casefile, id)),
    ...VEHICLE_IDS.flatMap((id) => approachItems(casefile, result, id)),
    ...contactItems(casefile),
  ];
}

function frameOf(casefile: CaseFile, id: VehicleId): Frame {
  const { x, y, heading } = casefile.impact[id];
  return { centre: { x: x.value, y: y.value }, forward: unit(heading.value) };
}

function vehicleItems(vehicle: Vehicle, frame: Frame, id: VehicleId): Item[] {
  const { length, width, wheelbase, track, frontOverhang, frontAxleToMassCentre } = vehicle;
  const front = frontAxleToMassCentre.value + frontOverhang;
  const half = width / 2;
  const box = (x: number, y: number, l: number, w: number): Point[] => [
    placed(frame, x + l / 2, y + w / 2),
    placed(frame, x - l / 2, y + w / 2),
    placed(frame, x - l / 2, y - w / 2),
    placed(frame, x + l / 2, y - w / 2),
  ];
  const axles = [frontAxleToMassCentre.value, frontAxleToMassCentre.value - wheelbase];
  const wheels = axles.flatMap((x) => [track / 2, -track / 2].map((y) => box(x, y, WHEEL.length, WHEEL.width)));
  const nose = [placed(frame, front - 0.5, half), placed(frame, front, 0), placed(frame, front - 0.5, -half)];
  return [
    { kind: 'polygon', role: `vehicle.${id}`, points: box(front - length / 2, 0, length, width) },
    ...wheels.map((points): Item => ({ kind: 'polygon', role: 'detail', points })),
    { kind: 'line', role: 'detail', points: nose },
    { kind: 'dot', role: 'centre', at: at(frame.centre) },
  ];
}

/** The letter of a vehicle, at the end that is farther from the contact point. */
function letterItem(casefile: CaseFile, id: VehicleId): Item {
  const { length, frontOverhang, frontAxleToMassCentre } = casefile.vehicles[id];
  const frame = frameOf(casefile, id);
  const front = frontAxleToMassCentre.value + frontOverhang;
  const { x, y } = casefile.impact.point;
  const ahead = dot(less({ x: x.value, y: y.value }, frame.centre), frame.forward) > front - length / 2;
  return { kind: 'label', at: placed(frame, ahead ? front - length + 0.9 : front - 1.1, 0), text: id, strong: true };
}

function travelItems(casefile: CaseFile, id: VehicleId): Item[] {
  const departure = casefile.departure[id];
  if (!departure) return [];
  if (departure.kind === 'legs') return legItems(casefile, departure, id);
  const { x, y, heading } = departure.rest;
  if (!x || !y || !heading) return [];
  const rest: Frame = { centre: { x: x.value, y: y.value }, forward: unit(heading.value) };
  const [outline] = vehicleItems(casefile.vehicles[id], rest, id);
  return [{ ...outline, role: `rest.${id}` } as Item];
}

/** How far the length of a leg stands off its line, m; beside the vehicle where the line still runs under it. */
const BESIDE = 0.3;

function legItems(casefile: CaseFile, departure: LegsDeparture, id: VehicleId): Item[] {
  const along = unit(departure.direction.value);
  const start = frameOf(casefile, id).centre;
  const { length, width } = casefile.vehicles[id];
  let from = start;
  const items = departure.legs.flatMap(({ distance }): Item[] => {
    const to = sum(from, scaled(along, distance.value));
    const middle = sum(from, scaled(along, distance.value / 2));
    const beside = size(less(middle, start)) > length / 2 ? BESIDE : width / 2 + BESIDE;
    const text = formatWithUnit(distance.value, 'length', unitsOf(casefile), { decimals: 2 });
    const leg: Item[] = [
      { kind: 'line', role: `travel.${id}`, points: [at(from), at(to)], arrow: true },
      { kind: 'label', at: at(sum(middle, scaled(perp(along), beside))), text },
    ];
    from = to;
    return leg;
  });
  return items;
}

/** The direction of approach: as stated, or as found where the method answers it. */
function approachItems(casefile: CaseFile, result: Result, id: VehicleId): Item[] {
  const speed = result.central[`${id}.approachSpeed`] ?? 0;
  const found = speed < SLOW ? undefined : result.central[`${id}.approachDirection`];
  const direction = casefile.approach[id].direction?.value ?? found;
  if (direction === undefined) return [];
  const { length, frontOverhang, frontAxleToMassCentre } = casefile.vehicles[id];
  const rear = length - frontOverhang - frontAxleToMassCentre.value;
  const head = sum(frameOf(casefile, id).centre, scaled(unit(direction), -(rear + 0.3)));
  return [
    {
      kind: 'line',
      role: `approach.${id}`,
      points: [at(sum(head, scaled(unit(direction), -ARROW))), at(head)],
      arrow: true,
    },
  ];
}

function contactItems(casefile: CaseFile): Item[] {
  const { point, plane } = casefile.impact;
  const P = { x: point.x.value, y: point.y.value };
  const along = scaled(unit(plane.value), PLANE_HALF);
  const apart = less(frameOf(casefile, 'B').centre, frameOf(casefile, 'A').centre);
  const either = perp(unit(plane.value));
  const normal = dot(either, apart) >= 0 ? either : scaled(either, -1);
  return [
    { kind: 'line', role: 'plane', points: [at(less(P, along)), at(sum(P, along))] },
    { kind: 'line', role: 'normal', points: [at(P), at(sum(P, scaled(normal, NORMAL)))], arrow: true },
    { kind: 'dot', role: 'point', at: at(P) },
  ];
}
