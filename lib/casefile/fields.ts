import type { Dimension } from '@/lib/units/dimension';
import { nodeAt } from './quantities';
import type { CaseFile, SpinDeparture, VehicleId } from './schema';
import { VEHICLE_IDS } from './schema';
import { WHEELS, type WheelId } from './wheels';

/**
 * Every value of a case that a person can enter, as one list: the ledger's rows, the report's input table, the words a
 * check uses to point at a value. Adding a field to the case file means adding its line here.
 */
export interface Field {
  path: string;
  label: string;
  group: GroupId;
  kind: 'quantity' | 'number' | 'text';
  /** Of the value; a text has none. */
  dimension: Dimension | null;
  /** May be null: the row then offers to add it. */
  optional: boolean;
  /** The thing on the board that it belongs to. */
  thing: ThingId;
}

export const GROUPS = [
  { id: 'A', title: 'Vehicle A' },
  { id: 'B', title: 'Vehicle B' },
  { id: 'contact', title: 'Contact' },
  { id: 'before', title: 'Before contact' },
  { id: 'after.A', title: 'After contact, A' },
  { id: 'after.B', title: 'After contact, B' },
  { id: 'damage.A', title: 'Damage, A' },
  { id: 'damage.B', title: 'Damage, B' },
  { id: 'recorded', title: 'Recorded' },
  { id: 'surfaces', title: 'Surfaces' },
] as const;
export type GroupId = (typeof GROUPS)[number]['id'];

/** What can be selected on the board and in the ledger. */
export type ThingId =
  | `vehicle.${VehicleId}`
  | 'contact.point'
  | 'contact.plane'
  | `approach.${VehicleId}`
  | `departure.${VehicleId}`
  | `leg.${VehicleId}.${number}`
  | `rest.${VehicleId}`
  | `wheel.${VehicleId}.${WheelId}`
  | `surface.${number}`
  | `mark.${number}`;

type Line = [key: string, label: string, dimension: Dimension | null, optional?: 'optional'];

const VEHICLE: Line[] = [
  ['name', 'Name', null],
  ['mass', 'Mass', 'mass'],
  ['length', 'Length', 'length'],
  ['width', 'Width', 'length'],
  ['wheelbase', 'Wheelbase', 'length'],
  ['track', 'Track', 'length'],
  ['frontOverhang', 'Front overhang', 'length'],
  ['frontAxleToMassCentre', 'Front axle to mass centre', 'length'],
  ['yawInertia', 'Yaw inertia', 'yawInertia', 'optional'],
];

const CONTACT: Line[] = [
  ['plane', 'Contact plane, direction', 'angle'],
  ['restitution', 'Restitution', 'ratio', 'optional'],
  ['impulseRatio', 'Impulse ratio (tangential / normal)', 'ratio', 'optional'],
];

const APPROACH: Line[] = [
  ['direction', 'direction of approach', 'angle', 'optional'],
  ['yawRate', 'yaw rate before contact', 'yawRate'],
  ['speed', 'known approach speed', 'speed', 'optional'],
];

/** What only the method fit takes. */
const FIT_CONTACT: Line[] = [
  ['friction', 'Friction of the contact', 'ratio', 'optional'],
  ['slide', 'Way slid along the plane', 'length', 'optional'],
];
const FIT_APPROACH: Line[] = [['slip', 'slip (direction less heading)', 'angle', 'optional']];
const asksForFit = ({ analysis }: CaseFile): boolean => analysis.method === 'fit';

const LEG: Line[] = [
  ['distance', 'distance', 'length'],
  ['friction', 'friction', 'ratio'],
  ['share', 'retardation share', 'ratio'],
  ['grade', 'grade (uphill positive)', 'ratio'],
];

/** Plain numbers of a vehicle's drawing, without a spread. */
const PLAIN = new Set(['length', 'width', 'wheelbase', 'track', 'frontOverhang']);

function field(
  path: string,
  [key, label, dimension, optional]: Line,
  group: GroupId,
  thing: ThingId,
  prefix = '',
): Field {
  const kind = dimension === null ? 'text' : PLAIN.has(key) ? 'number' : 'quantity';
  const spoken = prefix === '' ? label : `${prefix} ${label}`;
  return { path, label: spoken, group, kind, dimension, optional: optional === 'optional', thing };
}

/** All rows of a case, in reading order. */
export function fieldsOf(casefile: CaseFile): Field[] {
  return [
    ...VEHICLE_IDS.flatMap((id) => [
      ...VEHICLE.map((line) => field(`vehicles.${id}.${line[0]}`, line, id, `vehicle.${id}`)),
      ...poseFields(id),
    ]),
    field('impact.point.x', ['x', 'Contact point, x', 'length'], 'contact', 'contact.point'),
    field('impact.point.y', ['y', 'Contact point, y', 'length'], 'contact', 'contact.point'),
    ...CONTACT.map((line) => field(`impact.${line[0]}`, line, 'contact', 'contact.plane')),
    ...(asksForFit(casefile) ? FIT_CONTACT : []).map((line) =>
      field(`impact.${line[0]}`, line, 'contact', 'contact.plane'),
    ),
    field('pulse', ['pulse', 'Contact duration', 'time', 'optional'], 'contact', 'contact.plane'),
    ...VEHICLE_IDS.flatMap((id) =>
      [...APPROACH, ...(asksForFit(casefile) ? FIT_APPROACH : [])].map((line) =>
        field(`approach.${id}.${line[0]}`, line, 'before', `approach.${id}`, `${id}:`),
      ),
    ),
    ...VEHICLE_IDS.flatMap((id) => departureFields(casefile, id)),
    ...VEHICLE_IDS.flatMap((id) => damageFields(casefile, id)),
    ...VEHICLE_IDS.flatMap((id) =>
      RECORDED.map((line) => field(`recorded.${id}.${line[0]}`, line, 'recorded', `vehicle.${id}`, `${id}:`)),
    ),
    ...(casefile.scene?.surfaces ?? []).flatMap((_, k) => surfaceFields(k)),
  ];
}

function poseFields(id: VehicleId): Field[] {
  const lines: Line[] = [
    ['x', 'Mass centre at contact, x', 'length'],
    ['y', 'Mass centre at contact, y', 'length'],
    ['heading', 'Heading at contact', 'angle'],
  ];
  return lines.map((line) => field(`impact.${id}.${line[0]}`, line, id, `vehicle.${id}`));
}

function departureFields(casefile: CaseFile, id: VehicleId): Field[] {
  const departure = casefile.departure[id];
  if (departure?.kind === 'spin') return spinFields(departure, id);
  if (!departure) return [];
  const group: GroupId = `after.${id}`;
  const at = `departure.${id}`;
  const whole: Line[] = [
    ['direction', 'Direction of departure', 'angle'],
    ['yawRate', 'Yaw rate after contact', 'yawRate', 'optional'],
    ['endSpeed', 'Speed at the end of the travel', 'speed'],
  ];
  return [
    ...whole.map((line) => field(`${at}.${line[0]}`, line, group, `departure.${id}`)),
    ...departure.legs.flatMap((_, k) =>
      LEG.map((line) => field(`${at}.legs.${k}.${line[0]}`, line, group, `leg.${id}.${k}`, `Leg ${k + 1}:`)),
    ),
  ];
}

const RECORDED: Line[] = [
  ['forward', 'delta-V recorded, forward', 'speed', 'optional'],
  ['left', 'delta-V recorded, left', 'speed', 'optional'],
];

/** Force per damaged width is a + b times the depth. */
const DAMAGE: Line[] = [
  ['width', 'Damaged width', 'length'],
  ['forceAngle', 'Direction of force off the normal', 'angle'],
  ['a', 'Stiffness: force per width at no depth', 'forcePerWidth'],
  ['b', 'Stiffness: gain of force with depth', 'stiffnessPerWidth'],
];

function damageFields(casefile: CaseFile, id: VehicleId): Field[] {
  const depths = casefile.damage?.[id]?.depths;
  if (!depths) return [];
  const each = depths.map((_, k): Line => [`depths.${k}`, `Depth ${k + 1}`, 'length']);
  return [...DAMAGE, ...each].map((line) => field(`damage.${id}.${line[0]}`, line, `damage.${id}`, `vehicle.${id}`));
}
const SURFACE: Line[] = [
  ['name', 'name', null],
  ['friction', 'friction', 'ratio'],
];

const surfaceFields = (k: number): Field[] =>
  SURFACE.map((line) => field(`scene.surfaces.${k}.${line[0]}`, line, 'surfaces', `surface.${k}`, `Surface ${k + 1}:`));

/** What is no row of its own and may still be pointed at by a refusal or a check. */
const WHOLE_GROUPS: Record<string, string> = {
  approach: 'Before contact',
  departure: 'After contact',
  'departure.A': 'After contact, A',
  'departure.B': 'After contact, B',
  'departure.A.legs': 'A: Separation speed from the travel',
  'departure.B.legs': 'B: Separation speed from the travel',
  'restOffset.x': 'Rest of B less rest of A, x',
  'restOffset.y': 'Rest of B less rest of A, y',
  'restOffset.heading': 'Rest of B less rest of A, heading',
  'departure.A.rest': 'A: Rest pose',
  'departure.B.rest': 'B: Rest pose',
  impact: 'Contact',
  'analysis.method': 'Method',
  'analysis.contact': 'Kind of contact',
  'scene.surfaces': 'Surfaces',
  vehicles: 'Vehicles',
  'vehicles.A.seats': 'A: Seats',
  'vehicles.B.seats': 'B: Seats',
  'impact.slide': 'Length slid along the contact',
  'departure.A.yawRate': 'A: Yaw rate after contact',
  'departure.B.yawRate': 'B: Yaw rate after contact',
  damage: 'Damage',
  'damage.A': 'Damage, A',
  'damage.B': 'Damage, B',
  'damage.A.depths': 'A: Depths of damage',
  'damage.B.depths': 'B: Depths of damage',
  recorded: 'Recorded',
};

function groupLabel(path: string): string {
  const leg = /^departure\.([AB])\.legs\.(\d+)$/.exec(path);
  if (leg) return `${leg[1]}: Leg ${Number(leg[2]) + 1}`;
  const surface = /^scene\.surfaces\.(\d+)(\.outline)?(?:\.(\d+))?/.exec(path);
  if (!surface) return WHOLE_GROUPS[path] ?? path;
  const [, k, outline, corner] = surface;
  const part = corner ? `: corner ${Number(corner) + 1}` : outline ? ': corners' : '';
  return `Surface ${Number(k) + 1}${part}`;
}

function spinFields({ wheels, slope }: SpinDeparture, id: VehicleId): Field[] {
  const group: GroupId = `after.${id}`;
  const at = `departure.${id}`;
  const row = (key: string, label: string, dimension: Dimension, optional?: 'optional'): Field =>
    field(`${at}.${key}`, [key, label, dimension, optional], group, `rest.${id}`);
  const each = WHEELS.flatMap(({ id: wheel, words }) =>
    [
      row(`wheels.${wheel}.braking`, `Braking share, ${words}`, 'ratio'),
      row(`wheels.${wheel}.steer`, `Steer, ${words}`, 'angle'),
    ].map((own): Field => ({ ...own, thing: `wheel.${id}.${wheel}` })),
  );
  return [
    row('rest.x', 'Mass centre at rest, x', 'length'),
    row('rest.y', 'Mass centre at rest, y', 'length'),
    row('rest.heading', 'Heading at rest', 'angle'),
    row('friction', 'Friction', 'ratio'),
    ...('all' in wheels ? [row('wheels.all.braking', 'Braking share, all wheels', 'ratio')] : each),
    row('onset', 'Onset of braking after contact', 'time', 'optional'),
    ...(slope
      ? [row('slope.grade', 'Grade of the slope', 'ratio'), row('slope.uphill', 'Direction uphill', 'angle')]
      : []),
  ];
}

/** The rows of the cases that are asked about; listed once for each. */
const listed = new WeakMap<CaseFile, Field[]>();

function fieldsFor(casefile: CaseFile): Field[] {
  const known = listed.get(casefile) ?? fieldsOf(casefile);
  listed.set(casefile, known);
  return known;
}

/** The words for the value at a path, for checks and refusals; the path itself where no row has it. */
export function labelOf(casefile: CaseFile, path: string): string {
  const found = fieldsFor(casefile).find((f) => path === f.path || path.startsWith(`${f.path}.`));
  if (!found) return groupLabel(path);
  const vehicle = /^(?:after\.|damage\.)?([AB])$/.exec(found.group)?.[1];
  return vehicle ? `${vehicle}: ${found.label}` : found.label;
}

/** Whether the case states a value for the field. */
export const isStated = (casefile: CaseFile, f: Field): boolean => (nodeAt(casefile, f.path) ?? null) !== null;
