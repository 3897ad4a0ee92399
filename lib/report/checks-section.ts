import type { Check, Level, Result } from '@/lib/results/result';
import type { PrintedCheck, Section } from './report';

const ORDER: readonly Level[] = ['fail', 'caution', 'note', 'pass'];

/** What a check makes sure of, by its id. */
export const CHECK_TITLES: Record<string, string> = {
  energyGain: 'Energy is lost, not gained',
  energyShare: 'No more energy is lost than the contact could take',
  restitutionRange: 'Restitution between 0 and 1',
  restitutionTests: 'Restitution as in staged tests',
  restitutionRegression: 'Restitution beside recalled regressions',
  friction: 'Impulse ratio within believable friction',
  slidingReversal: 'The tangential impulse does not reverse the sliding',
  sideswipe: 'No sideswipe taken for an instant contact',
  closing: 'The contact point closes',
  contactPoint: 'The contact point lies on both vehicles',
  overlap: 'The vehicles touch at contact',
  engagement: 'The vehicles engage fully',
  leverArm: 'Where the contact point lies matters little',
  planeShare: 'The contact plane does not decide the delta-V',
  nearlyInLine: 'The directions of approach differ enough',
  heavyHeading: 'The direction of the heavier momentum is known well',
  correlated: 'Each approach speed is fixed by itself',
  amplification: 'Amplification by 1/e',
  sideSlip: 'Each vehicle moves along its heading before contact',
  yawMismatch: 'Yaw rates predicted and measured agree',
  tyreImpulse: 'Tyre impulse during the contact is small, or included',
  secondContact: 'The vehicles touched once',
  rotation: 'Rotation after contact is accounted for',
  seatDeltaV: 'Delta-V at the seats',
  speedRange: 'Closing speed within the range of the model',
  misfit: 'The pieces of evidence agree',
  converged: 'Two runs of the fit agree',
  priorDriven: 'The evidence narrows the speeds',
  knownSpeed: 'Stated approach speeds agree',
  recorded: 'Recorded delta-V agrees',
  recorderPulse: 'The contact is short enough for a recorder',
  recorderResolution: 'The spread of a recorded value is wide enough',
  recorderLateral: 'Recorded lateral delta-V and rotation',
  restPose: 'The rest pose is reproduced',
  otherTurns: 'Other turns that fit',
  driverControlled: 'The rest pose is not where the driver chose',
  coasting: 'No long way rolled almost freely',
  gradeAgainstDrag: 'The grade is small against the drag',
  damageEnergy: 'Energy lost and crush energy agree',
  damageSpeed: 'Closing speed from damage agrees',
  forceAngle: 'The damage shows the direction of the impulse',
  crushIntercept: 'Depths within what the stiffness was measured for',
  noDamage: 'Residual depth where damage is given',
  oneVehicle: 'Damage of both vehicles',
  impossibleShare: 'Few draws are impossible',
  wide: 'Intervals narrower than the answers',
};

/** What each screening check found and what to do about it; what failed comes first and stays in. */
export function checksSection({ checks }: Result): Section {
  const items = ORDER.flatMap((level) => checks.filter((check) => check.level === level).map(printed));
  return {
    id: 'checks',
    title: 'Checks, and what they mean',
    blocks: [
      {
        kind: 'paragraph',
        text: 'Each check holds a number of this case against a limit. A failed check withholds the result; a caution asks for a written response; a note is to be read. A check that passes is not a validation.',
      },
      { kind: 'checks', items },
    ],
  };
}

const printed = ({ id, level, says, advice, source }: Check): PrintedCheck => ({
  level,
  title: CHECK_TITLES[id] ?? id,
  says,
  advice: advice ?? '',
  source,
});
