import { defaultDeparture, drawnQuantity } from '@/lib/casefile/defaults';
import type { ThingId } from '@/lib/casefile/fields';
import {
  type CaseFile,
  type LegsDeparture,
  type Quantity,
  type SpinDeparture,
  VEHICLE_IDS,
  type VehicleId,
} from '@/lib/casefile/schema';
import { WHEELS } from '@/lib/casefile/wheels';
import type { NamedEdit } from './named-edit';

/** A thing of the board as an entry of a list that can be walked. */
export interface BoardItem {
  thing: ThingId;
  name: string;
  /** Name and numbers in words, for those who cannot see the drawing. */
  says: string;
  /** Where it is not drawn yet: what draws it. */
  add?: NamedEdit;
}

/** How numbers are said: lengths in m, angles in deg, and plain ones. */
export interface Spoken {
  length: (metres: number) => string;
  angle: (degrees: number) => string;
  ratio: (share: number) => string;
}

/** Standard uncertainty of what is added from the list, deg. */
const ADDED = 3;
/** Distance of a travel added from the list, m. */
const STRAIGHT_ON = 5;

/** All things of the board in reading order. */
export function boardList(casefile: CaseFile, say: Spoken): BoardItem[] {
  const { impact, scene } = casefile;
  const at = ({ x, y }: { x: Quantity; y: Quantity }): string => `${say.length(x.value)}, ${say.length(y.value)}`;
  return [
    ...VEHICLE_IDS.map((id): BoardItem => ({
      thing: `vehicle.${id}`,
      name: id,
      says: `Vehicle ${id}, mass centre at ${at(impact[id])}, heading ${say.angle(impact[id].heading.value)}`,
    })),
    { thing: 'contact.point', name: 'Contact point', says: `Contact point at ${at(impact.point)}` },
    { thing: 'contact.plane', name: 'Plane', says: `Contact plane, direction ${say.angle(impact.plane.value)}` },
    ...VEHICLE_IDS.map((id) => approachItem(casefile, id, say)),
    ...VEHICLE_IDS.flatMap((id) => travelItems(casefile, id, say)),
    ...(scene?.surfaces ?? []).map(({ name, outline, friction }, k): BoardItem => ({
      thing: `surface.${k}`,
      name: name || `Surface ${k + 1}`,
      says: `Surface ${k + 1}: ${name}, ${outline.length} corners, friction ${say.ratio(friction.value)}`,
    })),
    ...(scene?.marks ?? []).map(({ kind, label }, k): BoardItem => {
      const name = label || kind || `Mark ${k + 1}`;
      return { thing: `mark.${k}`, name, says: `Mark ${k + 1}: ${name}` };
    }),
  ];
}

function approachItem({ approach, impact }: CaseFile, id: VehicleId, say: Spoken): BoardItem {
  const { direction } = approach[id];
  const [thing, name] = [`approach.${id}` as const, `Approach ${id}`];
  if (direction) return { thing, name, says: `Approach of ${id}, direction ${say.angle(direction.value)}` };
  const to = drawnQuantity(impact[id].heading.value, ADDED);
  return {
    thing,
    name,
    says: `Add the approach of ${id}, along its heading`,
    add: { label: `add the approach of ${id}`, edit: { do: 'set', path: `approach.${id}.direction`, to } },
  };
}

function travelItems({ departure, impact }: CaseFile, id: VehicleId, say: Spoken): BoardItem[] {
  const travel = departure[id];
  if (travel?.kind === 'spin') return [restItem(travel, id, say), ...wheelItems(travel, id, say)];
  if (travel) return statedTravel(travel, id, say);
  const to = defaultDeparture(impact[id].heading.value, STRAIGHT_ON);
  return [
    {
      thing: `departure.${id}`,
      name: `Travel ${id}`,
      says: `Add the travel of ${id}, straight on for ${say.length(STRAIGHT_ON)}`,
      add: { label: `add the travel of ${id}`, edit: { do: 'set', path: `departure.${id}`, to } },
    },
  ];
}

function restItem({ rest }: SpinDeparture, id: VehicleId, say: Spoken): BoardItem {
  const { x, y, heading } = rest;
  const place = x && y ? `mass centre at ${say.length(x.value)}, ${say.length(y.value)}` : 'place not stated';
  const turn = heading ? `heading ${say.angle(heading.value)}` : 'heading not stated';
  return { thing: `rest.${id}`, name: `${id} at rest`, says: `Rest pose of ${id}, ${place}, ${turn}` };
}

/** Where they are set one by one. */
function wheelItems({ wheels }: SpinDeparture, id: VehicleId, say: Spoken): BoardItem[] {
  if ('all' in wheels) return [];
  return WHEELS.map(({ id: wheel, words }) => {
    const [braking, steer] = [say.ratio(wheels[wheel].braking.value), say.angle(wheels[wheel].steer.value)];
    return {
      thing: `wheel.${id}.${wheel}`,
      name: `${id} ${words}`,
      says: `Wheel of ${id}, ${words}, braking share ${braking}, steer ${steer}`,
    };
  });
}

function statedTravel({ direction, legs }: LegsDeparture, id: VehicleId, say: Spoken): BoardItem[] {
  const lengths = legs.map(({ distance }) => say.length(distance.value));
  const whole: BoardItem = {
    thing: `departure.${id}`,
    name: `Travel ${id}`,
    says: `Travel of ${id}, direction ${say.angle(direction.value)}, ${lengths.join(' then ')}`,
  };
  if (legs.length === 1) return [whole];
  const each = lengths.map((length, k): BoardItem => ({
    thing: `leg.${id}.${k}`,
    name: `${id} leg ${k + 1}`,
    says: `Leg ${k + 1} of ${id}, ${length}`,
  }));
  return [whole, ...each];
}

/** Whether an entry stands for what is selected: a travel of one leg stands for that leg too. */
export function standsFor(item: BoardItem, items: readonly BoardItem[], selection: ThingId | null): boolean {
  if (item.add || selection === null) return false;
  if (item.thing === selection) return true;
  const [kind, which] = selection.split('.');
  const isListed = items.some(({ thing }) => thing === selection);
  return !isListed && (kind === 'leg' || kind === 'rest') && item.thing === `departure.${which}`;
}
