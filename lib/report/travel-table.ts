import { type CaseFile, VEHICLE_IDS, type VehicleId } from '@/lib/casefile/schema';
import { type TimedPath, type TimedPose, type Travels, evenly } from '@/lib/geometry/timed-path';
import { toDegrees } from '@/lib/geometry/vector';
import { type UnitSystem } from '@/lib/units/dimension';
import { formatValue, unitOf } from '@/lib/units/format';
import { unitsOf } from './numbers';
import type { Row, Table } from './report';

/** Rows are this many equal stretches of time apart, and one more. */
const STRETCHES = 10;

/** Said of everything that shows a simulated travel: it is no recording. */
export const ILLUSTRATION = 'illustration of one computed case';

/** The simulated travel in figures: a group of rows for every vehicle that has one. */
export function travelTable(casefile: CaseFile, travels: Travels): Table {
  const units = unitsOf(casefile);
  const column = (title: string, unit: string): Table['columns'][number] => ({
    title: `${title}, ${unit}`,
    kind: 'number',
  });
  const [length, speed] = [unitOf('length', units).symbol, unitOf('speed', units).symbol];
  return {
    kind: 'table',
    caption: `Simulated travel, ${ILLUSTRATION}`,
    columns: [
      column('Time', 's'),
      column('x', length),
      column('y', length),
      column('Heading', '°'),
      column('Speed', speed),
    ],
    rows: VEHICLE_IDS.flatMap((id) => rowsOf(id, travels[id], units)),
    notes: [
      'Every input at its stated value. Time from first contact to rest; place and speed of the mass centre; heading counter-clockwise from the x axis of the plan.',
    ],
  };
}

function rowsOf(id: VehicleId, path: TimedPath | undefined, units: UnitSystem): Row[] {
  if (!path) return [];
  return [{ group: `Vehicle ${id}` }, ...evenly(path, STRETCHES).map((pose) => ({ cells: cellsOf(pose, units) }))];
}

const cellsOf = ({ time, x, y, heading, speed }: TimedPose, units: UnitSystem): string[] => [
  formatValue(time, 'time', units, { decimals: 2 }),
  formatValue(x, 'length', units, { decimals: 2 }),
  formatValue(y, 'length', units, { decimals: 2 }),
  formatValue(toDegrees(heading), 'angle', units, { decimals: 1 }),
  formatValue(speed, 'speed', units, { decimals: 1 }),
];
