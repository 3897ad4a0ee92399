import { HEADLINES, resultLabel } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import { failuresOf } from './failures';
import { sentence } from './numbers';
import type { Row, Section } from './report';

const MOST_INPUTS = 5;

/** Which inputs the spread of the leading results comes from, largest total index first. */
export function sensitivitySection(result: Result, labelOf: (path: string) => string): Section | null {
  const rows = HEADLINES.flatMap((name): Row[] => {
    const shares = Object.entries(result.sensitivity[name] ?? {}).sort(([, a], [, b]) => b.total - a.total);
    if (shares.length === 0) return [];
    return [
      { group: sentence(resultLabel(name)) },
      ...shares
        .slice(0, MOST_INPUTS)
        .map(([path, { first, total }]) => ({ cells: [labelOf(path), shareText(first), shareText(total)] })),
    ];
  });
  if (rows.length === 0 || failuresOf(result).length > 0) return null;
  return {
    id: 'sensitivity',
    title: 'Where the spread comes from',
    blocks: [
      {
        kind: 'paragraph',
        text: 'The share of each result’s variance that an input carries alone (first) and with all its interplay (total), by Sobol’ indices with the estimators of Jansen. The top of each list is the measurement most worth taking again. The shares are themselves estimates, good to about 2 hundredths.',
      },
      {
        kind: 'table',
        narrow: true,
        caption: `The ${MOST_INPUTS} inputs that matter most for each leading result`,
        columns: [
          { title: 'Input', kind: 'words' },
          { title: 'First', kind: 'number' },
          { title: 'Total', kind: 'number' },
        ],
        rows,
      },
    ],
  };
}

const shareText = (share: number): string => `${Math.max(0, Math.round(100 * share))}\u00a0%`;
