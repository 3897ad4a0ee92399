import type { CaseFile } from '@/lib/casefile/schema';
import type { Shapes } from '@/lib/results/bands';
import { type ResultName, resultLabel } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import type { UnitSystem } from '@/lib/units/dimension';
import { failuresOf } from './failures';
import { percent, printedBand, reachesZero, sentence, unitText, unitsOf } from './numbers';
import type { Block, HeadlineFigure, Section } from './report';
import { speedFigure } from './speed-figure';

const LEADING = ['A.approachSpeed', 'B.approachSpeed', 'A.deltaV', 'B.deltaV'] as const;

/** The first page: the four figures that the case was worked for, and what speaks against them. */
export function headlineSection(casefile: CaseFile, result: Result, shapes: Shapes): Section {
  const reasons = failuresOf(result);
  const units = unitsOf(casefile);
  const figures = LEADING.flatMap((name) => headlineFigure(name, result, units));
  const blocks: Block[] =
    reasons.length > 0
      ? [{ kind: 'withheld', reasons }]
      : [
          { kind: 'headline', figures },
          { kind: 'speeds', figure: speedFigure(result, shapes, units) },
        ];
  return {
    id: 'answer',
    title: 'Result in brief',
    blocks: [...blocks, ...(reasons.length > 0 ? [] : [conditions(result)]), ...against(result)],
  };
}

function headlineFigure(name: ResultName, result: Result, units: UnitSystem): HeadlineFigure[] {
  const band = result.bands[name];
  if (!band) return [];
  const label = sentence(resultLabel(name));
  const unit = unitText('speed', units);
  const { median, low, high, shortest } = printedBand(band, result.central[name], 'speed', units);
  const probability = percent(result.coverage);
  if (!reachesZero(band))
    return [{ label, value: median, unit, interval: `median; ${probability} interval ${low} to ${high} ${unit}` }];
  return [
    {
      label,
      value: `at most ${shortest[1]}`,
      unit,
      interval: `with ${probability}, from ${shortest[0]}; median ${median} ${unit}`,
    },
  ];
}

const conditions = ({ method, coverage, draws }: Result): Block => ({
  kind: 'paragraph',
  text:
    `Medians and ${percent(coverage)} coverage intervals, probabilistically symmetric, over ${draws.toLocaleString('en')} draws of the inputs ` +
    '(JCGM 101:2008); one that reaches down to 0 is given as an upper bound of the shortest interval. ' +
    `They hold for the method ${method}, the models and the inputs set out below, and for nothing else: if a fact changes, they have to be worked again.`,
});

/** The first page has room for so many. */
const MOST_CAUTIONS = 3;
const COUNTS = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine'];

/** What speaks against the result, in the words of the checks; the failed ones stand in its place already. */
function against({ checks }: Result): Block[] {
  const cautions = checks.filter((check) => check.level === 'caution').map((check) => check.says);
  if (checks.some((check) => check.level === 'fail'))
    return [
      {
        kind: 'paragraph',
        text: 'What each failed check means, and what to do about it, stands in the section on checks.',
      },
    ];
  if (cautions.length === 0)
    return [
      { kind: 'paragraph', text: 'No screening check spoke against the result. That is not a validation of it.' },
    ];
  const count =
    cautions.length === 1 ? 'One check speaks' : `${COUNTS[cautions.length] ?? cautions.length} checks speak`;
  const more = cautions.length - MOST_CAUTIONS;
  return [
    {
      kind: 'paragraph',
      text: `${count} against using these figures as they stand; what to do about it is in the section on checks.`,
    },
    {
      kind: 'list',
      ordered: false,
      items: [...cautions.slice(0, MOST_CAUTIONS), ...(more > 0 ? [`and ${more} more.`] : [])],
    },
  ];
}
