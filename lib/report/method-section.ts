import type { CaseFile, Method } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import { percent } from './numbers';
import type { Section } from './report';

export const METHOD_WORDS: Record<Method, string> = {
  directions: 'Momentum along two known directions of approach',
  restitution: 'Restitution and impulse ratio, worked back through the contact',
  fit: 'All evidence weighed together',
};

const HOW: Record<Method, string[]> = {
  directions: [
    'Each vehicle is taken from the end of its travel back to separation: over legs by the work of friction and grade; where a rest pose is stated, by the separation whose simulated travel on four wheels leads to it.',
    'The momentum of the pair after contact equals that before it. With both directions of approach known, its two components give the two approach speeds.',
    'The change of momentum of one vehicle is the impulse. Split along the contact plane and its normal it gives the impulse ratio; the motion of the contact point before and after gives closing speed and restitution; both together give the energy lost.',
    'Yaw rates after contact are used as measured where they were measured; the rates that the impulse predicts are held against them by a check.',
  ],
  restitution: [
    'Each vehicle is taken from the end of its travel back to separation: over legs by the work of friction and grade; where a rest pose is stated, by the separation whose simulated travel on four wheels leads to it.',
    'The speed at which the contact points part, divided by the restitution, is the speed at which they closed. With the stated impulse ratio that fixes the impulse.',
    'The impulse takes each vehicle from its motion after contact back to its motion before. Directions of approach and yaw rates before contact are results here, to be held against the road.',
  ],
  fit: [
    'Every uncertain value is an unknown with its stated spread as what is known beforehand; an approach speed that nothing is stated of is flat from 0 to 45 m/s, a restitution from 0 to 1, a contact friction from 0 to 1.5.',
    'From each state of the unknowns the collision is run forward: approach, contact with restitution and friction (instant, or lasting with the tyres pushing), separation, and where a rest pose is stated, simulated travel to rest.',
    'What that predicts is held against every piece of evidence, each once, with a normal distribution of its stated spread. Legs give one such piece for each vehicle, the separation speed, carried over from their own inputs.',
    'The states that explain the evidence are found by sequential Monte Carlo with a tempered likelihood and adaptive steps, which also gives the marginal likelihood that rival accounts are compared by.',
  ],
};

const SOURCES = [
  'Impact of two bodies in the plane: Brach, Mechanical Impact Dynamics (1991); Brach & Brach, Vehicle Accident Analysis and Reconstruction Methods. Impact with friction: Routh, Dynamics of a System of Rigid Bodies. Named from memory; to be confirmed by the author against the editions used.',
  'Uncertainty: JCGM 101:2008, propagation of distributions by a Monte Carlo method. Vehicle axes: ISO 8855. Standard gravity 9.80665 m/s²: NIST SP 811.',
];

/** How the answer was found, in words, with where the laws come from. */
export const methodSection = (result: Result): Section => ({
  id: 'method',
  title: 'Method',
  blocks: [
    { kind: 'paragraph', text: `${METHOD_WORDS[result.method]} (method ‘${result.method}’).` },
    { kind: 'list', ordered: true, items: HOW[result.method] },
    {
      kind: 'paragraph',
      text: `The spreads of the inputs are carried to the results by ${result.draws.toLocaleString('en')} draws, all inputs taken as independent of each other; intervals are stated at ${percent(result.coverage)}.`,
    },
    { kind: 'list', ordered: false, items: SOURCES },
  ],
});

/** What is taken for granted. */
export const assumptionsSection = (casefile: CaseFile): Section => ({
  id: 'assumptions',
  title: 'Assumptions',
  blocks: [{ kind: 'list', ordered: false, items: assumptions(casefile) }],
});

function assumptions(casefile: CaseFile): string[] {
  return [
    'Both vehicles are rigid bodies that move in one plane, apart from the damage at one common contact point.',
    casefile.analysis.contact === 'lasting'
      ? 'The contact lasts as long as stated, with a force that rises and falls as a half sine at one point fixed in one body; the tyres of both vehicles push meanwhile, and what they give is reckoned in. Vehicles on legs then have the friction and the retardation share of their first leg at every wheel.'
      : 'The contact is instantaneous: the vehicles do not move while it lasts, and the tyres give no impulse during it. How far that holds is bounded by the check on tyre impulse.',
    'Over each leg of the travel friction, retardation share and grade are constant.',
    ...(Object.values(casefile.departure).some((travel) => travel?.kind === 'spin')
      ? [
          'Simulated travel: four wheels under their static loads, with the braking and steer stated, on one plane; no one drove, and nothing was struck on the way.',
        ]
      : []),
    ...(casefile.pulse && casefile.analysis.contact !== 'lasting'
      ? ['The contact duration serves the accelerations only; it does not enter the speeds.']
      : []),
    'Inputs whose spread is not stated are taken as exact, and inputs are drawn independently of each other.',
  ];
}
