import type { ResultName } from '@/lib/results/names';
import type { SeatResult } from '@/lib/results/result';

/** One line of the worked calculation; formula, numbers and answer in the notation of maths.ts. */
export interface Step {
  number: string;
  what: string;
  formula: string;
  /** The same with the numbers put in: one entry per component. */
  numbers: string[];
  answer: string;
}

export interface Chapter {
  title: string;
  steps: Step[];
}

/** A sheet that the worked calculation is written on, line by line, and the results that its lines end in. */
export interface Sheet {
  chapters: Chapter[];
  /** Unrounded, in the units of the result file. */
  ends: Partial<Record<ResultName, number>>;
  /** Delta-V at the seats, in the order of the case. */
  seats: Record<'A' | 'B', SeatResult['central'][]>;
  begin: (title: string) => void;
  line: (what: string, formula: string, numbers: string | string[], answer: string) => void;
  end: (name: ResultName, value: number) => void;
}

/** «of A» is not broken over two lines. */
const bound = (what: string): string => what.replace(/ ([AB])\b/g, '\u00a0$1');

/** Nor is a figure parted from its unit. */
const withUnit = (answer: string): string => answer.replaceAll(' "', '\u00a0"').replaceAll('" °/s"', '"\u00a0°/s"');

export function newSheet(): Sheet {
  const chapters: Chapter[] = [];
  let count = 0;
  const sheet: Sheet = {
    chapters,
    ends: {},
    seats: { A: [], B: [] },
    begin: (title) => void chapters.push({ title, steps: [] }),
    line: (what, formula, numbers, answer) =>
      void chapters.at(-1)?.steps.push({
        number: String(++count),
        what: bound(what),
        formula,
        numbers: [numbers].flat(),
        answer: withUnit(answer),
      }),
    end: (name, value) => void (sheet.ends[name] = value),
  };
  return sheet;
}
