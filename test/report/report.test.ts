import { readFileSync } from 'node:fs';
import { beforeAll, describe, expect, test } from 'vitest';
import { parseCase } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Block, Report } from '@/lib/report/report';
import { writeReport } from '@/lib/report/write-report';
import type { Travels } from '@/lib/geometry/timed-path';
import type { Shapes } from '@/lib/results/bands';
import type { Result } from '@/lib/results/result';
import { solveCase } from '@/lib/solve-case';

interface Solved {
  casefile: CaseFile;
  result: Result;
  shapes: Shapes;
  travels: Travels;
}

async function solvedExample(name: string, units: 'metric' | 'us' = 'metric', draws = 4000): Promise<Solved> {
  const parsed = parseCase(readFileSync(`public/examples/${name}.case.json`));
  if (!parsed.ok) throw new Error('the example is not valid');
  const casefile: CaseFile = { ...parsed.casefile, display: { units, paper: 'A4' } };
  const outcome = await solveCase(casefile, { draws, sensitivity: draws > 100 });
  if (outcome.kind !== 'solved') throw new Error('the example is not solved');
  return { casefile, result: outcome.result, shapes: outcome.shapes, travels: outcome.travels };
}

const blocksOf = (report: Report): Block[] => report.sections.flatMap((section) => section.blocks);
const only = <K extends Block['kind']>(report: Report, kind: K) =>
  blocksOf(report).filter((block): block is Extract<Block, { kind: K }> => block.kind === kind);

/** Cells of the row of a table whose first cell is this, in the order of the report. */
const rowsNamed = (report: Report, name: string): string[][] =>
  only(report, 'table').flatMap(({ rows }) =>
    rows.flatMap((row) => ('cells' in row && row.cells[0] === name ? [row.cells] : [])),
  );

const failed = (result: Result): Result => ({
  ...result,
  checks: [
    { id: 'closing', level: 'fail', says: 'The vehicles would be moving apart.', source: 'test', paths: [] },
    ...result.checks,
  ],
});

describe('the junction example', () => {
  let solved: Solved;
  let report: Report;
  beforeAll(async () => {
    solved = await solvedExample('junction');
    report = writeReport(solved.casefile, solved.result, solved.shapes, { revision: 3, saved: 1_796_117_400_000 });
  });

  test('leads with the four speeds, rounded once from the medians, with at most one decimal', () => {
    const [headline] = only(report, 'headline');
    const names = ['A.approachSpeed', 'B.approachSpeed', 'A.deltaV', 'B.deltaV'];
    expect(headline.figures.map(({ value, unit }) => `${value} ${unit}`)).toEqual(
      names.map((name) => `${(solved.result.bands[name].median * 3.6).toFixed(1)} km/h`),
    );
    for (const { interval } of headline.figures)
      expect(interval).toMatch(/^median; 95\u00a0% interval [\d.]+ to [\d.]+ km\/h$/);
  });

  test('no number is printed with plus-minus, and none is NaN or undefined', () => {
    const text = JSON.stringify(report);
    expect(text).not.toMatch(/±|NaN|undefined|Infinity/);
  });

  test('carries what is needed to get the same digits again', () => {
    const text = JSON.stringify(report);
    for (const needed of [solved.result.case, solved.result.engine, '4,000', 'revision 3, saved 2026-12-01 09:30 UTC'])
      expect(text).toContain(needed);
    expect(report.header.edges.hash).toBe(`case\u00a0${solved.result.case.slice(0, 12)}`);
  });

  test('every stated quantity stands in the table of inputs with its source', () => {
    const cells = rowsNamed(report, 'Leg 1: retardation share');
    expect(cells).toEqual([
      ['Leg 1: retardation share', '0.6', '', 'rectangular, 0.5 to 0.7', 'part braked, part scrubbing'],
      ['Leg 1: retardation share', '0.45', '', 'rectangular, 0.37 to 0.53', 'part braked, part scrubbing'],
    ]);
    expect(rowsNamed(report, 'Yaw inertia, estimated')).toHaveLength(2);
  });

  test('figures are rounded to the second digit of their standard uncertainty', () => {
    const { median, sd } = solved.result.bands['A.departureYawRate'];
    expect(sd).toBeGreaterThan(1);
    expect(sd).toBeLessThan(10);
    const cells = rowsNamed(report, 'Yaw rate after contact').find((row) => row.length === 7) ?? [];
    expect(cells.slice(3, 5)).toEqual([median.toFixed(1), sd.toFixed(1)]);
  });

  test('every check of the result is printed, the worst first', () => {
    const [{ items }] = only(report, 'checks');
    expect(items).toHaveLength(solved.result.checks.length);
    const order = ['fail', 'caution', 'note', 'pass'];
    const ranks = items.map(({ level }) => order.indexOf(level));
    expect(ranks).toEqual([...ranks].sort((a, b) => a - b));
  });

  test('the same arguments give the same plain data', () => {
    const again = writeReport(solved.casefile, solved.result, solved.shapes, { revision: 3, saved: 1_796_117_400_000 });
    expect(JSON.stringify(again)).toBe(JSON.stringify(report));
    expect(JSON.parse(JSON.stringify(report))).toEqual(report);
  });

  test('the standing cautions are there, and injury is named only to exclude it', () => {
    const cautions = only(report, 'list').find(({ items }) => items[0].startsWith('This is a decision aid'));
    expect(cautions?.items[4]).toMatch(/^Delta-V is a measure of vehicle motion\. No conclusion about injury/);
    expect(JSON.stringify(report).match(/injur/gi)).toHaveLength(1);
  });

  test('a failed check withholds every figure, in words, and the picture too', () => {
    const withheld = writeReport(solved.casefile, failed(solved.result), solved.shapes);
    expect(only(withheld, 'headline')).toEqual([]);
    expect(only(withheld, 'speeds')).toEqual([]);
    expect(only(withheld, 'withheld')).toEqual([
      { kind: 'withheld', reasons: ['The vehicles would be moving apart.'] },
    ]);
    const printed = rowsNamed(withheld, 'Approach speed');
    expect(printed).toHaveLength(2);
    for (const row of printed) expect(row.slice(2)).toEqual(Array(5).fill('withheld'));
    const brief = JSON.stringify(withheld.sections[0]);
    expect(brief).not.toContain((solved.result.bands['A.approachSpeed'].median * 3.6).toFixed(1));
  });

  test.each(['A4', 'Letter'] as const)(
    'the plan is true to scale on %s and holds both vehicles and their travel',
    (paper) => {
      const [{ drawing }] = only(writeReport(solved.casefile, solved.result, solved.shapes, { paper }), 'plan');
      expect(drawing.scale.ratio).toBe(100);
      const outline = drawing.items.find((item) => item.kind === 'polygon' && item.role === 'vehicle.A');
      if (outline?.kind !== 'polygon') throw new Error('vehicle A is not on the plan');
      const [[x0, y0], [x1, y1]] = outline.points;
      expect(Math.hypot(x1 - x0, y1 - y0)).toBeCloseTo(46.2, 9);
      const travelled = drawing.items.filter((item) => item.kind === 'line' && item.role === 'travel.B');
      expect(travelled).toHaveLength(2);
      for (const item of drawing.items)
        if (item.kind === 'polygon' || (item.kind === 'line' && item.role !== 'mark'))
          for (const [x, y] of item.points) {
            expect(x).toBeGreaterThan(0);
            expect(x).toBeLessThan(drawing.width);
            expect(y).toBeGreaterThan(0);
            expect(y).toBeLessThan(drawing.height);
          }
    },
  );

  test('the author’s part is left to the author', () => {
    expect(JSON.stringify(report)).toContain('Author, instructions and declaration: to be supplied by the author.');
    expect(only(report, 'signature')).toHaveLength(1);
  });
});

test('in US units the headline is in mph and the inputs in feet and pounds', async () => {
  const { casefile, result, shapes } = await solvedExample('junction', 'us');
  const report = writeReport(casefile, result, shapes);
  const [headline] = only(report, 'headline');
  // 1 mph = 0.44704 m/s exactly (NIST SP 811, appendix B.8).
  expect(headline.figures[0].value).toBe((result.bands['A.approachSpeed'].median / 0.44704).toFixed(1));
  expect(headline.figures[0].unit).toBe('mph');
  // 1 lb = 0.45359237 kg exactly (NIST SP 811, appendix B.8); u is 20 kg, so pounds need no decimals.
  expect(rowsNamed(report, 'Mass')[0].slice(1, 3)).toEqual([(1510 / 0.45359237).toFixed(0), 'lb']);
  // 1 ft = 0.3048 m exactly.
  expect(rowsNamed(report, 'Length')[0].slice(1, 3)).toEqual([(4.62 / 0.3048).toFixed(3), 'ft']);
});

test('a speed that reaches down to nothing is given as an upper bound, not with an interval around it', async () => {
  const { casefile, result, shapes } = await solvedExample('queue');
  const band = result.bands['B.approachSpeed'];
  expect(band.low / band.high).toBeLessThan(0.1);
  const [headline] = only(writeReport(casefile, result, shapes), 'headline');
  expect(headline.figures[1].value).toBe(`at most ${(band.shortest[1] * 3.6).toFixed(1)}`);
  expect(headline.figures[1].interval).toContain(`median ${(band.median * 3.6).toFixed(1)} km/h`);
});

describe('the nudge example, whose travel is simulated', () => {
  let solved: Solved;
  beforeAll(async () => {
    solved = await solvedExample('nudge', 'us', 100);
  });

  test('prints the travel of both vehicles in the units of the case, from contact to rest, and draws their paths', () => {
    const { casefile, result, shapes, travels } = solved;
    const report = writeReport(casefile, result, shapes, {}, travels);
    const section = report.sections.find(({ id }) => id === 'travel');
    const [table] = section?.blocks ?? [];
    if (table?.kind !== 'table') throw new Error('there is no table of the travel');
    expect(table.caption).toContain('illustration of one computed case');
    expect(table.columns.map(({ title }) => title)).toEqual(['Time, s', 'x, ft', 'y, ft', 'Heading, °', 'Speed, mph']);
    expect(table.rows).toHaveLength(24);
    // 1 ft = 0.3048 m exactly.
    const cells = (k: number): string[] => (table.rows[k] as { cells: string[] }).cells;
    expect(cells(1).slice(0, 2)).toEqual(['0.00', `\u2212${(1.94 / 0.3048).toFixed(2)}`]);
    expect(cells(11).slice(1, 4)).toEqual([`\u2212${(1.27 / 0.3048).toFixed(2)}`, (0.12 / 0.3048).toFixed(2), '0.6']);
    expect(cells(23)[3]).toBe('128.0');
    const [{ drawing }] = only(report, 'plan');
    const paths = drawing.items.filter((item) => item.kind === 'line' && item.points.length > 60);
    expect(paths).toHaveLength(2);
  });

  test('withholds it with the other figures when a check fails', () => {
    const { casefile, result, shapes, travels } = solved;
    const report = writeReport(casefile, failed(result), shapes, {}, travels);
    expect(report.sections.some(({ id }) => id === 'travel')).toBe(false);
  });
});

test('a case whose travel is given by legs has no section on simulated travel', async () => {
  const { casefile, result, shapes, travels } = await solvedExample('junction');
  expect(travels).toEqual({});
  expect(writeReport(casefile, result, shapes, {}, travels).sections.some(({ id }) => id === 'travel')).toBe(false);
});
