import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Band, Result } from '@/lib/results/result';
import { type DensityPoint, axisOf, densityOf, speedRows } from '@/lib/results/series';
import { readFileSync } from 'node:fs';
import { checkCase } from '@/lib/casefile/parse';
import { solveCase } from '@/lib/solve-case';
import type { CaseFile } from '@/lib/casefile/schema';

const area = (points: readonly DensityPoint[]): number =>
  points.slice(1).reduce((sum, { x, y }, k) => sum + ((x - points[k].x) * (y + points[k].y)) / 2, 0);

const shapes = fc.record({
  low: fc.double({ min: -50, max: 50, noNaN: true }),
  width: fc.double({ min: 0.01, max: 100, noNaN: true }),
  counts: fc.array(fc.nat(5000), { minLength: 1, maxLength: 80 }).filter((counts) => counts.some((n) => n > 0)),
});
const SEED = 20261201;

describe('the density of a result', () => {
  test('has area 1, is nowhere negative and spans the shape', () => {
    fc.assert(
      fc.property(shapes, ({ low, width, counts }) => {
        const points = densityOf({ low, high: low + width, counts });
        expect(area(points)).toBeCloseTo(1, 9);
        expect(points.every(({ y }) => y >= 0)).toBe(true);
        expect(points[0].x).toBe(low);
        expect(points.at(-1)?.x).toBe(low + width);
      }),
      { seed: SEED },
    );
  });

  test('keeps the place of a lone mode, and one point per bin', () => {
    const points = densityOf({ low: 0, high: 10, counts: [0, 1, 4, 9, 4, 1, 0, 0, 0, 0] });
    const highest = points.reduce((best, point) => (point.y > best.y ? point : best));
    expect(highest.x).toBeCloseTo(3.5, 12);
    expect(points).toHaveLength(12);
  });

  test('is even where every bin holds as many', () => {
    const points = densityOf({ low: 2, high: 6, counts: [7, 7, 7, 7] });
    for (const { y } of points) expect(y).toBeCloseTo(0.25, 12);
  });

  test('does not exist where there is no spread', () => {
    expect(densityOf({ low: 3, high: 3, counts: [9, 0, 0] })).toEqual([]);
    expect(densityOf({ low: 3, high: 4, counts: [0, 0] })).toEqual([]);
  });
});

describe('the picture of the speeds', () => {
  const band = (low: number, high: number): Band => ({
    mean: (low + high) / 2,
    sd: (high - low) / 4,
    median: (low + high) / 2,
    low,
    high,
    shortest: [low, high],
  });

  test('its axis holds 0, every interval and every density', () => {
    const rows = [
      {
        name: 'A.deltaV' as const,
        band: band(3, 9),
        density: [
          { x: 1, y: 0 },
          { x: 12, y: 0 },
        ],
      },
      { name: 'closingSpeed' as const, band: band(-2, 4), density: [] },
    ];
    expect(axisOf(rows)).toEqual([-2, 12]);
    expect(axisOf([{ name: 'A.deltaV', band: band(3, 9), density: [] }])).toEqual([0, 9]);
  });

  test('leaves out what has no band', () => {
    const result = { bands: { closingSpeed: band(1, 2) } } as unknown as Result;
    expect(speedRows(result, {}).map(({ name }) => name)).toEqual(['closingSpeed']);
  });

  test('of a worked case: each interval lies inside its density, and holds about the stated share of it', async () => {
    const document: unknown = JSON.parse(readFileSync('public/examples/junction.case.json', 'utf8'));
    expect(checkCase(document).ok).toBe(true);
    const outcome = await solveCase(document as CaseFile, { sensitivity: false });
    if (outcome.kind !== 'solved') throw new Error(outcome.kind);
    const rows = speedRows(outcome.result, outcome.shapes);
    expect(rows).toHaveLength(5);
    for (const { band: found, density } of rows) {
      const inside = density.filter(({ x }) => x >= found.low && x <= found.high);
      // 60 bins over at most three intervals: one bin at each end is a few per cent of the area.
      expect(area(inside)).toBeGreaterThan(0.88);
      expect(area(inside)).toBeLessThan(0.97);
    }
  });
});
