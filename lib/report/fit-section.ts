import { labelOf } from '@/lib/casefile/fields';
import type { CaseFile } from '@/lib/casefile/schema';
import { ratioOf } from '@/lib/results/likelihood-ratio';
import type { FitResult, Result } from '@/lib/results/result';
import { printedBand, unitText } from './numbers';
import { failuresOf } from './failures';
import type { Block, Row, Section, Table } from './report';

/** Below this contraction an unknown is set mainly by what was put in beforehand (screening value). */
const MAINLY_PRIOR = 0.5;
/** Unknowns that the evidence narrowed by at least this are listed. */
const NARROWED = 0.1;

/** What a fit weighed, how it went, and the rival accounts beside each other; null for another method. */
export function fitSection(casefile: CaseFile, result: Result): Section | null {
  const { fit } = result;
  if (!fit) return null;
  const withheld = failuresOf(result).length > 0;
  return {
    id: 'fit',
    title: 'What the evidence says together',
    blocks: [
      {
        kind: 'paragraph',
        text: `${result.draws.toLocaleString('en')} states of everything that is unknown were weighed against every piece of evidence (sequential Monte Carlo with a tempered likelihood; Del Moral, Doucet & Jasra 2006), twice over. ${howItWent(fit)}`,
      },
      observationsTable(casefile, fit),
      unknownsTable(casefile, fit),
      ...(withheld ? [] : rivalBlocks(casefile, result)),
    ],
  };
}

const howItWent = ({ temperatures, acceptance, effectiveSize, logEvidence, secondRun }: FitResult): string =>
  `${temperatures} temperatures, ${Math.round(100 * acceptance)} % of the moves taken, ${effectiveSize} states that differ; log of the marginal likelihood ${signed(logEvidence)}, in the second run ${signed(secondRun.logEvidence)}; the mean speeds of both runs differ by ${secondRun.disagreement.toFixed(2)} standard uncertainties.`;

/** One decimal, with a true minus and no negative nothing. */
const signed = (x: number): string => (Math.abs(x) < 0.05 ? '0.0' : x.toFixed(1).replace('-', '−'));

/** Predicted against observed, per piece of evidence. */
export function observationsTable(casefile: CaseFile, fit: FitResult): Table {
  return {
    kind: 'table',
    caption: `Observed less predicted at the central state; chi-square ${fit.chiSquare.toFixed(1)} over ${fit.degreesOfFreedom} pieces of evidence`,
    columns: [
      { title: 'Evidence', kind: 'words' },
      { title: 'Residual in standard uncertainties', kind: 'number' },
    ],
    rows: Object.entries(fit.residuals).map(([path, residual]) => ({
      cells: [labelOf(casefile, path), signed(residual)],
    })),
  };
}

/** How much the evidence narrowed what was put in beforehand. */
function unknownsTable(casefile: CaseFile, fit: FitResult): Table {
  const narrowed = Object.entries(fit.contraction)
    .filter(([path, share]) => share >= NARROWED || path.endsWith('.speed'))
    .sort(([, a], [, b]) => b - a);
  const rows: Row[] = narrowed.map(([path, share]) => ({
    cells: [
      labelOf(casefile, path),
      `${Math.max(0, Math.round(100 * share))} %`,
      share < MAINLY_PRIOR ? 'prior' : 'evidence',
    ],
  }));
  return {
    kind: 'table',
    caption: 'Share of the prior variance that the evidence took from an unknown; the rest is as it was put in',
    columns: [
      { title: 'Unknown', kind: 'words' },
      { title: 'Narrowed by', kind: 'number' },
      { title: 'Set mainly by', kind: 'words' },
    ],
    rows,
  };
}

function rivalBlocks(casefile: CaseFile, result: Result): Block[] {
  if (result.hypotheses.length === 0) return [];
  return [rivalsTable(casefile, result), { kind: 'list', ordered: false, items: rivalWords(result) }];
}

/** The rival accounts side by side. */
export function rivalsTable(casefile: CaseFile, { hypotheses, coverage }: Result): Table {
  const units = casefile.display?.units ?? 'metric';
  const speed = (band: Result['bands'][string] | undefined): string => {
    if (!band) return '–';
    const { median, low, high } = printedBand(band, undefined, 'speed', units);
    return band.sd === 0 ? median : `${median} (${low} to ${high})`;
  };
  return {
    kind: 'table',
    caption: `Rival accounts: what each says of the approach speeds, ${unitText('speed', units)}, median and ${Math.round(100 * coverage)} % interval, and the log of its marginal likelihood`,
    columns: [
      { title: 'Account', kind: 'words' },
      { title: 'Approach speed of A', kind: 'number' },
      { title: 'Approach speed of B', kind: 'number' },
      { title: 'log marginal likelihood', kind: 'number' },
    ],
    rows: hypotheses.map(({ name, bands, logEvidence, says }) => ({
      cells: [
        says ? `${name}: ${says}` : name,
        speed(bands['A.approachSpeed']),
        speed(bands['B.approachSpeed']),
        logEvidence === undefined ? '–' : signed(logEvidence),
      ],
    })),
  };
}

/** Each account against the first, in words and number. */
export function rivalWords({ hypotheses }: Result): string[] {
  const [first, ...others] = hypotheses;
  const said = others.flatMap((other) => {
    if (first.logEvidence === undefined || other.logEvidence === undefined) return [];
    const { log10, error, words, ratio } = ratioOf(first.logEvidence - other.logEvidence);
    const [ahead, behind] = log10 >= 0 ? [first.name, other.name] : [other.name, first.name];
    return [
      `The evidence is about ${ratio} times as probable if ‘${ahead}’ is so than if ‘${behind}’ is (log10 of the likelihood ratio ${Math.abs(log10).toFixed(1)} ± ${error.toFixed(1)}): ${words}.`,
    ];
  });
  if (said.length === 0) return [];
  return [
    ...said,
    'A likelihood ratio compares two stated accounts, given the model and the inputs, and depends on how wide each account is. It is not the probability that an account is true.',
    'Verbal scale after the ENFSI guideline for evaluative reporting (2015), from memory: confirm its wording before relying on it.',
  ];
}
