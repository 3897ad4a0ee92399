import type { CaseFile } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import type { Block, Section } from './report';
import { failuresOf } from './failures';
import { largestDifference, workedCalculation } from './worked/calculation';
import { roadGiven } from './worked/road';
import { withSimulatedGiven } from './worked/simulated';
import { WORKED_DIGITS } from './worked/figure';

/** Differences below this are the last bits of the arithmetic. */
const SAME = 1e-9;

/** The calculation at the central values, line by line, with how well its ends agree with the engine. */
export function workedSection(casefile: CaseFile, result: Result): Section | null {
  const sheet = workedCalculation(withSimulatedGiven(casefile, result.central), result.method, roadGiven(result));
  if (!sheet) return null;
  const failed: Block[] =
    failuresOf(result).length === 0
      ? []
      : [
          {
            kind: 'paragraph',
            text: 'A check failed: these lines are printed so that the failure can be traced. Their ends are not results.',
          },
        ];
  return {
    id: 'worked',
    title: 'The calculation, worked at the central values',
    blocks: [
      ...failed,
      {
        kind: 'paragraph',
        text:
          'Every line can be checked by hand: the formula, the numbers put in, the answer. SI units throughout. ' +
          `Figures are carried unrounded and printed to ${WORKED_DIGITS} significant digits, so a hand check with the printed figures may differ in the last of them. ` +
          agreement(largestDifference(sheet, result.central)) +
          (isSimulated(casefile) ? SIMULATED : '') +
          (casefile.analysis.contact === 'lasting' ? LASTING : ''),
      },
      { kind: 'symbols', rows: SYMBOLS },
      { kind: 'steps', chapters: sheet.chapters },
    ],
  };
}

const isSimulated = ({ departure: { A, B } }: CaseFile): boolean => A?.kind === 'spin' || B?.kind === 'spin';

const SIMULATED =
  ' Where the travel of a vehicle is simulated, its separation is taken from the simulation as given: those steps cannot be written out by hand.';

const LASTING =
  ' What the tyres gave while the contact lasted is taken from the simulation of the contact as given, for the same reason.';

const agreement = (difference: number): string =>
  difference < SAME
    ? 'These lines are reckoned apart from the engine; all their ends agree with its central values to nine significant digits.'
    : `These lines are reckoned apart from the engine, and DISAGREE with its central values by up to ${difference.toExponential(1)} (relative): do not use this report until that is explained.`;

const SYMBOLS: [string, string][] = [
  ['m, I', 'mass, yaw inertia about the mass centre'],
  ['!r, !P', 'mass centre and contact point at contact'],
  ['Γ', 'direction of the contact plane'],
  ['!n, !t', 'unit normal (from A into B) and unit tangent of the contact plane'],
  ['!d', 'arm from the mass centre to the contact point'],
  ['s, δ', 'speed and direction of the mass centre'],
  ['!v, ω', 'velocity and yaw rate'],
  ['!c, !u', 'velocity of the contact point on a vehicle; relative velocity A less B there'],
  ['!J', 'impulse on B'],
  ['!T, τ', 'impulse and change of the yaw rate that the road gave while the contact lasted'],
  ['e, μ', 'restitution, impulse ratio'],
  ['d_{k}, f_{k}, q_{k}, G_{k}', 'distance, friction, retardation share, grade of leg k'],
  ['ψ, x, y', 'heading; seat position in vehicle axes'],
  ['′', 'after contact'],
];
