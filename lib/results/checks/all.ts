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
import { converged } from './converged';
import { correlated } from './correlated';
import { heavyHeading } from './heavy-heading';
import { planeShare } from './plane-share';
import { leverArm } from './lever-arm';
import { rotation } from './rotation';
import { engagement } from './engagement';
import { sideswipe } from './sideswipe';
import { energyShare } from './energy-share';
import { restitutionTests } from './restitution-tests';
import { seatDeltaVDiffers } from './seat-delta-v';
import { damageEnergy } from './damage-energy';
import { damageSpeed } from './damage-speed';
import { forceAngle } from './force-angle';
import { crushIntercept } from './crush-intercept';
import { noDamage } from './no-damage';
import { oneVehicle } from './one-vehicle';
import { coasting } from './coasting';
import { gradeAgainstDrag } from './grade-against-drag';
import { driverControlled } from './driver-controlled';
import { priorDriven } from './prior-driven';
import { recorded } from './recorded';
import { knownSpeed } from './known-speed';
import { recorderPulse } from './recorder-pulse';
import { recorderResolution } from './recorder-resolution';
import { recorderLateral } from './recorder-lateral';
import { restitutionRegression } from './restitution-regression';
import { wide } from './wide';
import { yawMismatch } from './yaw-mismatch';

/** Every check, in the order in which they are listed. */
export const CHECKS: readonly CheckRule[] = [
  energyGain,
  energyShare,
  restitutionRange,
  restitutionTests,
  restitutionRegression,
  friction,
  slidingReversal,
  sideswipe,
  closing,
  contactPoint,
  overlap,
  engagement,
  leverArm,
  planeShare,
  nearlyInLine,
  heavyHeading,
  correlated,
  amplification,
  sideSlip,
  yawMismatch,
  rotation,
  seatDeltaVDiffers,
  tyreImpulse,
  restPose,
  otherTurns,
  secondContact,
  driverControlled,
  coasting,
  gradeAgainstDrag,
  damageEnergy,
  damageSpeed,
  forceAngle,
  crushIntercept,
  noDamage,
  oneVehicle,
  speedRange,
  misfit,
  converged,
  priorDriven,
  knownSpeed,
  recorded,
  recorderPulse,
  recorderResolution,
  recorderLateral,
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
