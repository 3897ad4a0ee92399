import type { Check } from '../result';
import { amplification } from './amplification';
import type { CheckContext, CheckRule } from './check';
import { closing } from './closing';
import { contactPoint } from './contact-point';
import { energyGain } from './energy-gain';
import { friction } from './friction';
import { impossibleShare } from './impossible-share';
import { misfit } from './misfit';
import { nearlyInLine } from './nearly-in-line';
import { overlap } from './overlap';
import { otherTurns } from './other-turns';
import { restPose } from './rest-pose';
import { restitutionRange } from './restitution-range';
import { secondContact } from './second-contact';
import { sideSlip } from './side-slip';
import { slidingReversal } from './sliding-reversal';
import { speedRange } from './speed-range';
import { tyreImpulse } from './tyre-impulse';
import { wide } from './wide';
import { yawMismatch } from './yaw-mismatch';

/** Every check, in the order in which they are listed. */
export const CHECKS: readonly CheckRule[] = [
  energyGain,
  restitutionRange,
  friction,
  slidingReversal,
  closing,
  contactPoint,
  overlap,
  nearlyInLine,
  amplification,
  sideSlip,
  yawMismatch,
  tyreImpulse,
  restPose,
  otherTurns,
  secondContact,
  speedRange,
  misfit,
  impossibleShare,
  wide,
];

/** What each check that applies to the case found. */
export function checksOf(context: CheckContext): Check[] {
  return CHECKS.flatMap(({ id, source, find }) => {
    const finding = find(context);
    if (!finding) return [];
    const { value, limit, advice, paths, ...rest } = finding;
    return [
      {
        id,
        ...rest,
        ...(Number.isFinite(value) ? { value } : {}),
        ...(Number.isFinite(limit) ? { limit } : {}),
        ...(advice === undefined ? {} : { advice }),
        source,
        paths: paths ?? [],
      },
    ];
  });
}
