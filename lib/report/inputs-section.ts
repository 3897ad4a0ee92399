import { DEFAULT_SOURCE } from '@/lib/casefile/defaults';
import { type Field, GROUPS, fieldsOf, isStated } from '@/lib/casefile/fields';
import { nodeAt } from '@/lib/casefile/quantities';
import type { CaseFile, Quantity, VehicleId } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import { percent, sizeOf, spreadText, stated, unitText, unitsOf } from './numbers';
import type { Block, Row, Section, Table } from './report';

/** Everything that was put in: value, unit, how well it is known, and where it comes from. */
export function inputsSection(casefile: CaseFile, result: Result): Section {
  const fields = fieldsOf(casefile).filter((field) => field.kind !== 'text' && isStated(casefile, field));
  const rows = GROUPS.flatMap(({ id, title }): Row[] => {
    const own = fields.filter((field) => field.group === id).map((field) => inputRow(casefile, field));
    const estimated = id === 'A' || id === 'B' ? estimatedInertia(casefile, result, id) : [];
    const all = [...own, ...estimated];
    return all.length === 0 ? [] : [{ group: titled(casefile, id, title) }, ...all];
  });
  const table: Table = {
    kind: 'table',
    caption: 'Inputs, each with its spread and its source',
    columns: [
      { title: 'Quantity', kind: 'words' },
      { title: 'Value', kind: 'number' },
      { title: 'Unit', kind: 'words' },
      { title: 'Spread', kind: 'words' },
      { title: 'Source', kind: 'words' },
    ],
    rows,
    notes: inputNotes(casefile),
  };
  const notes: Block[] = casefile.notes ? [{ kind: 'paragraph', text: `Notes to the case: ${casefile.notes}` }] : [];
  return { id: 'inputs', title: 'What was put in', blocks: [...notes, table] };
}

const titled = (casefile: CaseFile, id: string, title: string): string =>
  id === 'A' || id === 'B' ? `${title}: ${casefile.vehicles[id].name}` : title;

/** A label that names its vehicle in front («A: direction of approach») keeps it; others begin with a capital. */
function inputRow(casefile: CaseFile, field: Field): Row {
  const units = unitsOf(casefile);
  const dimension = field.dimension ?? 'ratio';
  const node = nodeAt(casefile, field.path) as Quantity | number;
  const unit = unitText(dimension, units);
  if (typeof node === 'number')
    return {
      cells: [field.label, stated(node, dimension, units), unit, 'taken as exact', 'dimensions of the vehicle'],
    };
  return {
    cells: [
      field.label,
      stated(node.value, dimension, units, sizeOf(node.spread)),
      unit,
      spreadText(node.spread, dimension, units),
      sourceOf(node),
    ],
  };
}

const MARK = '†';
/** Of the estimate, relative (SAE 1999-01-1336, 73 cars). */
const YAW_INERTIA_RELATIVE_SD = 0.073;

function sourceOf({ source }: Quantity): string {
  if (!source) return 'not stated';
  return source === DEFAULT_SOURCE ? `${source} ${MARK}` : source;
}

function estimatedInertia(casefile: CaseFile, result: Result, id: VehicleId): Row[] {
  const inertia = result.more[`${id}.yawInertia`];
  if (casefile.vehicles[id].yawInertia || inertia === undefined) return [];
  const units = unitsOf(casefile);
  return [
    {
      cells: [
        'Yaw inertia, estimated',
        stated(inertia, 'yawInertia', units, YAW_INERTIA_RELATIVE_SD * inertia),
        unitText('yawInertia', units),
        `normal, u = ${percent(YAW_INERTIA_RELATIVE_SD)} of it`,
        'from mass and axle distances ‡',
      ],
    },
  ];
}

function inputNotes(casefile: CaseFile): string[] {
  const notes = [
    'u is the standard uncertainty. Angles run counter-clockwise from the x axis of the plan; positions are those of the plan.',
  ];
  if (JSON.stringify(casefile).includes(JSON.stringify(DEFAULT_SOURCE)))
    notes.push(`${MARK} A starting value that nobody has measured or touched for this case.`);
  if (VEHICLE_IDS.some((id) => !casefile.vehicles[id].yawInertia))
    notes.push(
      '‡ I = 1.091 m a b with a, b the distances from the mass centre to the axles: mean dynamic index of the 73 cars of the NHTSA inertial database (SAE 1999-01-1336), relative standard uncertainty 7.3 %. For vans and lorries the index is nearer 1.002.',
    );
  return notes;
}
