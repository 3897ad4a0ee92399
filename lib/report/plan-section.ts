import type { CaseFile } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import type { Travels } from '@/lib/geometry/timed-path';
import type { Result } from '@/lib/results/result';
import { type Bounds, boundsOf } from '@/lib/scene/view';
import { markLabelAt } from './mark-label';
import { type Scale, millimetresPerMetre, roomForPlan, scaleFor } from './paper';
import { planItems } from './plan-items';
import type { Drawing, Item, Point, Role } from './plan-sheet';
import type { Paper, Section } from './report';

/** Free paper around what the plan must show, m. */
const AROUND = 0.6;

/** The plan at true scale on a page of its own. */
export function planSection(casefile: CaseFile, result: Result, paper: Paper, travels: Travels): Section {
  const drawing = drawPlan(casefile, planItems(casefile, result, travels), paper);
  return {
    id: 'plan',
    title: 'Plan',
    ownPage: true,
    blocks: drawing
      ? [{ kind: 'plan', drawing }]
      : [{ kind: 'paragraph', text: 'What the case states is spread too wide for a plan at 1 : 500 on this paper.' }],
  };
}

/** All that must lie on the sheet: everything but the marks, which may run off it. */
function boundsOfPlan(items: Item[]): Bounds {
  const points = items.flatMap((item): Point[] => {
    if (item.kind === 'dot') return [item.at];
    return item.kind === 'label' || item.role === 'mark' ? [] : item.points;
  });
  const { left, right, bottom, top } = boundsOf(points);
  return { left: left - AROUND, right: right + AROUND, bottom: bottom - AROUND, top: top + AROUND };
}

function drawPlan(casefile: CaseFile, items: Item[], paper: Paper): Drawing | null {
  const box = boundsOfPlan(items);
  const room = roomForPlan(paper);
  const scale = scaleFor(box.right - box.left, box.top - box.bottom, room);
  if (!scale) return null;
  const mm = millimetresPerMetre(scale);
  const [midX, midY] = [(box.left + box.right) / 2, (box.bottom + box.top) / 2];
  const onPaper = ([x, y]: Point): Point => [room.width / 2 + (x - midX) * mm, room.height / 2 - (y - midY) * mm];
  return {
    scale,
    ...room,
    grid: gridLines(scale, onPaper, room),
    north: casefile.scene?.north ?? 90,
    items: items.map((item) => moved(item, onPaper)).flatMap((item) => [item, ...markLabel(item, room)]),
    legend: legendOf(items),
    caption: `Plan at contact, scale 1 : ${scale.ratio} when printed at actual size; grid ${scale.grid} m, coordinates in metres. Drawn from the figures of the case; it illustrates one computed case and is not a recording.`,
  };
}

function moved(item: Item, onPaper: (point: Point) => Point): Item {
  return item.kind === 'dot' || item.kind === 'label'
    ? { ...item, at: onPaper(item.at) }
    : { ...item, points: item.points.map(onPaper) };
}

function markLabel(item: Item, room: { width: number; height: number }): Item[] {
  if (item.kind !== 'line' || !item.label) return [];
  const at = markLabelAt(item.points, room);
  return at ? [{ kind: 'label', at, text: item.label }] : [];
}

function gridLines(
  scale: Scale,
  onPaper: (point: Point) => Point,
  room: { width: number; height: number },
): Drawing['grid'] {
  const [x0, y0] = onPaper([0, 0]);
  const step = scale.grid * millimetresPerMetre(scale);
  const along = (axis: 'x' | 'y', origin: number, size: number, sense: 1 | -1): Drawing['grid'] => {
    const lines: Drawing['grid'] = [];
    for (let k = Math.ceil(-origin / step); origin + k * step <= size; k++)
      lines.push({ axis, at: origin + k * step, metres: k === 0 ? 0 : sense * k * scale.grid });
    return lines;
  };
  return [...along('x', x0, room.width, 1), ...along('y', y0, room.height, -1)];
}

const LEGEND: [Role, string][] = [
  ...VEHICLE_IDS.flatMap((id): [Role, string][] => [
    [`vehicle.${id}`, `${id} at contact`],
    [`approach.${id}`, `Approach of ${id}`],
    [`travel.${id}`, `Travel, rest of ${id}`],
  ]),
  ['centre', 'Mass centre'],
  ['point', 'Contact point'],
  ['plane', 'Contact plane'],
  ['normal', 'Normal, A into B'],
  ['mark', 'Kerb, line or mark'],
];

function legendOf(items: Item[]): Drawing['legend'] {
  const used = new Set(items.flatMap((item) => (item.kind === 'label' ? [] : [item.role])));
  return LEGEND.filter(([role]) => used.has(role)).map(([role, text]) => ({ role, text }));
}
