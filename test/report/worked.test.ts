import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { parseCase } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import { parseMaths } from '@/lib/report/maths';
import { largestDifference, workedCalculation } from '@/lib/report/worked/calculation';
import type { Step } from '@/lib/report/worked/sheet';
import { roadGiven } from '@/lib/report/worked/road';
import { withSimulatedGiven } from '@/lib/report/worked/simulated';
import type { Result } from '@/lib/results/result';
import { solveCase } from '@/lib/solve-case';
import { type Reckoned, reckon } from '../support/reckon';

const FOLDERS = ['public/examples', 'test/cases'];
const files = FOLDERS.flatMap((folder) => readdirSync(folder).map((name) => `${folder}/${name}`)).filter(
  (f) =>
    // A fit runs forward from many states; there are no lines to write out.
    f.endsWith('.case.json') && !readFileSync(f, 'utf8').includes('"method": "fit"'),
);

function read(file: string): CaseFile {
  const parsed = parseCase(readFileSync(file));
  if (!parsed.ok) throw new Error(`${file} is not valid`);
  return parsed.casefile;
}

async function solved(casefile: CaseFile): Promise<Result> {
  const outcome = await solveCase(casefile, { draws: 50, sensitivity: false });
  if (outcome.kind !== 'solved') throw new Error('not solved');
  return outcome.result;
}

const workedOf = (casefile: CaseFile, result: Result) =>
  workedCalculation(withSimulatedGiven(casefile, result.central), result.method, roadGiven(result));

async function stepsOf(casefile: CaseFile): Promise<Step[]> {
  const steps = workedOf(casefile, await solved(casefile))?.chapters.flatMap((chapter) => chapter.steps) ?? [];
  expect(steps.length).toBeGreaterThan(20);
  return steps;
}

describe.each(files)('%s', (file) => {
  const casefile = read(file);

  test('the worked lines end in the engine’s central values, to 1e-9, and in all of them', async () => {
    const result = await solved(casefile);
    const sheet = workedOf(casefile, result);
    if (!sheet) throw new Error('nothing was worked');
    expect(Object.keys(sheet.ends).sort()).toEqual(Object.keys(result.central).sort());
    expect(largestDifference(sheet, result.central)).toBeLessThan(1e-9);
    for (const id of ['A', 'B'] as const)
      result.seats[id].forEach((seat, k) => {
        for (const [key, value] of Object.entries(seat.central)) expect(sheet.seats[id][k][key]).toBeCloseTo(value, 9);
      });
  });

  test('every line can be checked by hand: the printed numbers give the printed answer', async () => {
    for (const step of await stepsOf(casefile)) {
      const line = step.numbers.join(' ').split(/\s+= /)[0];
      const found = reckon(line);
      const printed = answerOf(step);
      const lengths = typeof printed === 'number' && typeof found !== 'number' ? Math.hypot(...found) : found;
      expectNear(lengths, printed, largestFigure(line), `${step.number} ${step.what}: ${line} -> ${step.answer}`);
    }
  });

  test('every formula is well formed', async () => {
    for (const { formula, numbers, answer } of await stepsOf(casefile))
      for (const source of [formula, ...numbers, answer]) expect(() => parseMaths(source)).not.toThrow();
  });
});

/** The figure or pair of an answer, without its symbol and unit. */
function answerOf({ answer }: Step): Reckoned {
  const figures = (answer.includes(' = ') ? answer.split(' = ')[1] : answer).replace(/\s?".*$/, '').replace('°', '');
  return reckon(figures);
}

const largestFigure = (line: string): number => Math.max(1, ...(line.match(/\d+(\.\d+)?/g) ?? []).map(Number));

/** Six printed digits: differences of large numbers lose some, so the slack grows with the largest number of the line. */
function expectNear(found: Reckoned, printed: Reckoned, largest: number, line: string): void {
  const [a, b] = [[found].flat(), [printed].flat()];
  expect(a.length, line).toBe(b.length);
  a.forEach((x, k) => expect(Math.abs(x - b[k]), line).toBeLessThanOrEqual(1e-4 * Math.abs(b[k]) + 2e-6 * largest));
}

test('a line with a wrong number in it is found out', () => {
  expect(reckon('frac{2.1 * (-0.6) - 3}{root{4}} + 2 (1 - 0.5)^2')).toBeCloseTo((-1.26 - 3) / 2 + 0.5, 12);
  expect(reckon('2 * (cos 60°, sin 30°)')).toEqual([expect.closeTo(1, 12), expect.closeTo(1, 12)]);
  expect(() => expectNear(reckon('2 * 3.1'), 6.3, 3.1, '')).toThrow();
});
