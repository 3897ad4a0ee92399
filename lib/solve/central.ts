import type { VehicleId } from '@/lib/casefile/schema';
import type { Problem } from '@/lib/evidence/problem';
import type { ImpactAnswer, ImpactState, Reason } from '@/lib/mechanics/impact-backwards';
import { legStartSpeedSquared } from '@/lib/mechanics/legs';
import { type FigureName, columnOf, figuresOf } from './columns';
import { CENTRAL_STEPS, Kernel } from './kernel';
import type { Travels } from '@/lib/geometry/timed-path';
import { type SpinsFound, findSpins, travelsOf } from './spin-central';

/** The answer with every input at its value. */
export interface Central {
  /** The problem, which knows where the draws of simulated travel begin. */
  problem: Problem;
  /** What was found for each vehicle whose travel is simulated. */
  spins: SpinsFound;
  /** Why it is impossible, or null. */
  reason: Reason | null;
  /** Where the reason is `leg`: the vehicle and the leg, counted from 0. */
  failingLeg: { vehicle: VehicleId; leg: number } | null;
  /** SI and radians; a value that does not exist is NaN. */
  figures: Record<FigureName, number>;
  state: ImpactState;
  answer: ImpactAnswer;
  /** The contact that lasts, where the case asks for one. */
  contact: ContactThatLasted | null;
  /** The motions that were simulated. */
  travels: Travels;
}

/** Solves every input at its value, and first looks for the separations of simulated travel. */
export function solveCentral(asked: Problem): Central {
  const { problem, spins } = findSpins(asked);
  return solvedAt(problem, spins);
}

/** Solves every input at its value. */
export function solvedAt(problem: Problem, spins: SpinsFound): Central {
  const kernel = new Kernel(problem, CENTRAL_STEPS);
  const reason = kernel.solveCentral();
  const figures = Object.fromEntries(
    figuresOf(problem).map((name) => [name, columnOf(kernel.columns, name)[0]]),
  ) as Central['figures'];
  return {
    problem,
    spins,
    reason,
    failingLeg: reason === 'leg' ? failingLeg(problem) : null,
    figures,
    state: kernel.state,
    answer: kernel.answer,
    contact: contactOf(kernel),
    travels: problem.fit ? kernel.forwardTravels() : travelsOf(spins),
  };
}

/** What a contact that lasts was like: the pair at its end (PAIR), s and m. */
export interface ContactThatLasted {
  y: Float64Array;
  duration: number;
  penetration: number;
  slide: number;
}

function contactOf({ lasting, forward }: Kernel): ContactThatLasted | null {
  if (forward) return forward.contact;
  return lasting?.pushed ? { ...lasting.pushed, duration: lasting.duration } : null;
}

/** The first leg, going back from rest, whose start has no real speed: A before B. */
function failingLeg({ inputs, vehicles }: Problem): Central['failingLeg'] {
  for (const vehicle of ['A', 'B'] as const) {
    const { departure } = vehicles[vehicle];
    if (departure.kind !== 'legs') continue;
    const { legs, endSpeed } = departure;
    let squared = inputs[endSpeed].value ** 2;
    for (let leg = legs.length - 1; leg >= 0; leg--) {
      const { distance, friction, share, grade } = legs[leg];
      squared = legStartSpeedSquared(
        squared,
        inputs[distance].value,
        inputs[friction].value,
        inputs[share].value,
        inputs[grade].value,
      );
      if (!(squared >= 0)) return { vehicle, leg };
    }
  }
  return null;
}
