import type { CaseFile, VehicleId } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import { RESULT_NAMES, type ResultName, resultDimension, resultLabel } from '@/lib/results/names';
import type { Band, Result } from '@/lib/results/result';
import type { Dimension, UnitSystem } from '@/lib/units/dimension';
import { failuresOf } from './failures';
import { NOTHING, percent, printedBand, sentence, stated, unitText, unitsOf } from './numbers';
import type { Row, Section, Table } from './report';

/** Every result with its band, and the seats. */
export function resultsSection(casefile: CaseFile, result: Result): Section {
  const units = unitsOf(casefile);
  const withheld = failuresOf(result).length > 0;
  const seats = VEHICLE_IDS.flatMap((id) => seatRows(result, id, units, withheld));
  return {
    id: 'results',
    title: 'Results with their spread',
    blocks: [bandTable(result, units, withheld), ...(seats.length > 0 ? [seatTable(result, seats)] : [])],
  };
}

const bandColumns = (first: string, coverage: number): Table['columns'] => [
  { title: first, kind: 'words' },
  { title: 'Unit', kind: 'words' },
  { title: 'Central', kind: 'number' },
  { title: 'Median', kind: 'number' },
  { title: 'u', kind: 'number' },
  { title: `${percent(coverage)} symmetric`, kind: 'number' },
  { title: `${percent(coverage)} shortest`, kind: 'number' },
];

function bandTable(result: Result, units: UnitSystem, withheld: boolean): Table {
  const group = (title: string, names: ResultName[]): Row[] => [
    { group: title },
    ...names
      .filter((name) => name in result.central || name in result.bands)
      .map((name) => bandRow(name, result, units, withheld)),
  ];
  const of = (id: VehicleId): ResultName[] => RESULT_NAMES.filter((name) => name.startsWith(`${id}.`));
  return {
    kind: 'table',
    caption: 'Results: central value, median, standard uncertainty u, and coverage intervals',
    columns: bandColumns('Result', result.coverage),
    rows: [
      ...group('Vehicle A', of('A')),
      ...group('Vehicle B', of('B')),
      ...group(
        'The pair',
        RESULT_NAMES.filter((name) => !name.includes('.')),
      ),
    ],
    notes: [
      'Central: every input at its stated value. Median and intervals: over the draws. Where the two differ, the distribution is skewed, and median and interval are the result. ' +
        'Figures are rounded once, to the second digit of u. A ratio of two uncertain numbers may have no standard uncertainty; none is printed for restitution and impulse ratio.',
      'Directions are measured counter-clockwise from the x axis of the plan; directions of delta-V from the front of the vehicle to its left. ' +
        'Delta-V points the way the velocity changed; the push came from the opposite side.',
    ],
  };
}

/** Ratios of uncertain numbers, whose variance need not exist. */
const NO_UNCERTAINTY = new Set<ResultName>(['restitution', 'impulseRatio']);

function bandRow(name: ResultName, result: Result, units: UnitSystem, withheld: boolean): Row {
  const dimension = resultDimension(name);
  const label = sentence(resultLabel(name).replace(/ of [AB]$/, ''));
  const unit = unitText(dimension, units);
  if (withheld) return { cells: [label, unit, ...Array<string>(5).fill('withheld')] };
  const cells = bandCells(result.central[name], result.bands[name], dimension, units);
  if (NO_UNCERTAINTY.has(name) && result.bands[name]?.sd !== 0 && result.method === 'directions') cells[2] = NOTHING;
  return { cells: [label, unit, ...cells] };
}

/** An interval of directions wider than this says nothing, deg: the vehicle as good as stands. */
const ANY_DIRECTION = 300;

/** Central, median, u and both intervals. A band without width repeats one number. */
function bandCells(
  central: number | undefined,
  band: Band | undefined,
  dimension: Dimension,
  units: UnitSystem,
): string[] {
  if (!band)
    return [central === undefined ? NOTHING : stated(central, dimension, units), ...Array<string>(4).fill(NOTHING)];
  if (band.low === band.high) {
    const exact = stated(band.median, dimension, units);
    return [exact, exact, '0', 'exact', 'exact'];
  }
  if (dimension === 'angle' && band.high - band.low > ANY_DIRECTION)
    return [...Array<string>(3).fill(NOTHING), 'any', 'any'];
  const printed = printedBand(band, central, dimension, units);
  const [from, to] = printed.shortest;
  return [printed.central, printed.median, printed.u, `${printed.low} to ${printed.high}`, `${from} to ${to}`];
}

const SEAT_RESULTS = [
  ['deltaV', 'delta-V'],
  ['deltaVForward', 'forward'],
  ['deltaVLeft', 'to the left'],
] as const;

function seatRows(result: Result, id: VehicleId, units: UnitSystem, withheld: boolean): Row[] {
  return result.seats[id].flatMap((seat) => [
    { group: `Vehicle ${id}, ${seat.name}` },
    ...SEAT_RESULTS.map(([key, words]) => {
      const unit = unitText('speed', units);
      const cells = withheld
        ? Array<string>(5).fill('withheld')
        : bandCells(seat.central[key], seat.bands[key], 'speed', units);
      return { cells: [sentence(words), unit, ...cells] };
    }),
  ]);
}

const seatTable = (result: Result, rows: Row[]): Table => ({
  kind: 'table',
  caption: 'Change of velocity at the seats: rigid-vehicle kinematics, not the motion of an occupant',
  columns: bandColumns('Seat', result.coverage),
  rows,
});
