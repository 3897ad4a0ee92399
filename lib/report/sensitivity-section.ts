import { HEADLINES, type ResultName, resultLabel } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import { failuresOf } from './failures';
import { sentence } from './numbers';
import type { Row, Section } from './report';

/** An input stands in the table when it carries at least this share of some leading result. */
const LEAST = 0.05;

/** Which inputs the spread of the leading results comes from: total Sobol' indices, the weightiest input first. */
export function sensitivitySection(result: Result, labelOf: (path: string) => string): Section | null {
  const traced = HEADLINES.filter((name) => result.sensitivity[name]);
  const paths = weightiest(result, traced);
  if (paths.length === 0 || failuresOf(result).length > 0) return null;
  const rows: Row[] = paths.map((path) => ({
    cells: [inputName(labelOf(path)), ...traced.map((name) => shareText(totalOf(result, name, path)))],
  }));
  return {
    id: 'sensitivity',
    title: 'Where the spread comes from',
    blocks: [
      {
        kind: 'paragraph',
        text: 'The share of each result’s variance that goes back to an input, alone and in its interplay with others (total Sobol’ indices, estimators of Jansen). The weightiest input is the measurement most worth taking again. The shares are themselves estimates, good to some hundredths, and need not add up to 100\u00a0%.',
      },
      {
        kind: 'table',
        caption: `Share of the variance of each leading result; inputs that carry at least ${shareText(LEAST)} of one of them`,
        columns: [
          { title: 'Input', kind: 'words' },
          ...traced.map((name) => ({
            title: sentence(resultLabel(name))
              .replace(/ at the contact point$/, '')
              .replace(/ ([AB])$/, '\u00a0$1'),
            kind: 'number' as const,
          })),
        ],
        rows,
      },
    ],
  };
}

const totalOf = (result: Result, name: ResultName, path: string): number =>
  result.sensitivity[name]?.[path]?.total ?? 0;

function weightiest(result: Result, traced: ResultName[]): string[] {
  const greatest = (path: string): number => Math.max(...traced.map((name) => totalOf(result, name, path)));
  const paths = [...new Set(traced.flatMap((name) => Object.keys(result.sensitivity[name])))];
  return paths.filter((path) => greatest(path) >= LEAST).sort((p, q) => greatest(q) - greatest(p));
}

/** «A: Leg 1: friction» reads better as «A, leg 1, friction». */
const inputName = (label: string): string =>
  label
    .replace(/^([AB]): (.)/, (_, id: string, letter: string) => `${id}, ${letter.toLowerCase()}`)
    .replace(': ', ', ');

function shareText(share: number): string {
  const hundredths = Math.round(100 * share);
  return hundredths < 1 ? '·' : `${hundredths}\u00a0%`;
}
