export type Paper = 'A4' | 'Letter';

/** Width and height of a sheet, mm (ISO 216; ANSI/ASME Y14.1). */
const SHEETS: Record<Paper, [width: number, height: number]> = { A4: [210, 297], Letter: [215.9, 279.4] };
/** Margins of the printed page, mm; the same stand in the page rules of the style sheet. */
const MARGINS = { top: 21, side: 16, bottom: 19 };
/** What heading, legend and caption of the plan take of the page, mm. */
const AROUND_PLAN = 46;

/** The room that a plan has on a page of its own, mm. */
export function roomForPlan(paper: Paper): { width: number; height: number } {
  const [width, height] = SHEETS[paper];
  return { width: width - 2 * MARGINS.side, height: height - MARGINS.top - MARGINS.bottom - AROUND_PLAN };
}

/** A standard scale 1 : `ratio`, with its grid spacing and scale bar, both in metres. */
export interface Scale {
  ratio: number;
  grid: number;
  bar: number;
}

/** The scales that plans are drawn at, largest first. */
const SCALES: readonly Scale[] = [
  { ratio: 20, grid: 0.5, bar: 1 },
  { ratio: 50, grid: 1, bar: 2 },
  { ratio: 100, grid: 1, bar: 5 },
  { ratio: 200, grid: 2, bar: 10 },
  { ratio: 250, grid: 5, bar: 10 },
  { ratio: 500, grid: 5, bar: 20 },
];

/** Millimetres of paper per metre of world. */
export const millimetresPerMetre = (scale: Scale): number => 1000 / scale.ratio;

/** The largest scale at which width x height metres fit the room (mm); null where even the smallest is too large. */
export function scaleFor(width: number, height: number, room: { width: number; height: number }): Scale | null {
  return SCALES.find((scale) => fits(width, height, scale, room)) ?? null;
}

const fits = (width: number, height: number, scale: Scale, room: { width: number; height: number }): boolean =>
  width * millimetresPerMetre(scale) <= room.width && height * millimetresPerMetre(scale) <= room.height;
