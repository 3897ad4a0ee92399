import { readFileSync } from 'node:fs';
import { parseCase } from '@/lib/casefile/parse';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import { readEvidence } from '@/lib/evidence/read-evidence';
import type { VehicleState } from '@/lib/mechanics/impact-backwards';
import { type Rest, travelToRest } from '@/lib/mechanics/spin';
import { type Target, missOf } from '@/lib/mechanics/spin-backwards';
import { solveCentral } from '@/lib/solve/central';
import { Kernel } from '@/lib/solve/kernel';
import { ERROR as CENTRAL_ERROR } from '@/lib/solve/spin-central';
import { DRAW_ERROR, separateDraw, targetOf } from '@/lib/solve/spin-travel';
import type { SpinSlots } from '@/lib/evidence/problem';
import { KINDS, type Kind, type Travel, apart, randomTravels } from '../support/random-travels';
import { cashKarpToRest, odexToRest } from '../support/travel-peers';
import { type Line, compare, times } from './measure';

/** Simulation to rest against integrators from outside, on the same equations of motion, and its inversion in a draw. */

const SEED = 20261208;
/** Travels of each kind: 2,000 in all, of which so many are timed. */
const CHECKED = 500;
const TIMED = 300;
const MILLIMETRE = 1e-3;
const TWENTIETH_DEGREE = (0.05 * Math.PI) / 180;

type Simulate = (travel: Travel) => Rest;

const ofDraw: Simulate = ({ motion, start }) => travelToRest(motion, start, DRAW_ERROR);
const ofCentral: Simulate = ({ motion, start }) => travelToRest(motion, start, CENTRAL_ERROR);
const odex =
  (tolerance: number, longest = 0): Simulate =>
  ({ motion, start }) =>
    odexToRest(motion, start, tolerance, longest);
const cashKarp =
  (scale: 'own' | 'absolute'): Simulate =>
  ({ motion, start }) =>
    cashKarpToRest(motion, start, 1e-6, scale);

interface Checked {
  kind: Kind;
  travels: Travel[];
  /** By odex at 1e-9 with short steps. */
  exact: Rest[];
}

const missesOf = ({ travels, exact }: Checked, simulate: Simulate, count: number) =>
  travels.slice(0, count).map((travel, i) => apart(simulate(travel), exact[i]));

const percentile99 = (misses: { place: number }[]): number =>
  misses.map(({ place }) => place).sort((a, b) => a - b)[Math.ceil(0.99 * misses.length) - 1];

/** Draws: 99 % within 1 mm, where the wheels roll freely no worse than the peer; central answers: each within 1 mm and 0.05 degrees. */
function checked(kind: Kind): Checked {
  const travels = randomTravels(kind, CHECKED, SEED);
  const one: Checked = { kind, travels, exact: travels.map(odex(1e-9, 0.02)) };
  const allowed = kind === 'free rolling' ? percentile99(missesOf(one, odex(1e-6), TIMED)) : MILLIMETRE;
  const draws = percentile99(missesOf(one, ofDraw, TIMED));
  if (!(draws <= allowed)) throw new Error(`${kind}: draws miss by ${draws} m, allowed ${allowed}`);
  for (const { place, turn } of missesOf(one, ofCentral, CHECKED))
    if (!(place <= MILLIMETRE && turn <= TWENTIETH_DEGREE)) throw new Error(`${kind}: central misses by ${place} m`);
  return one;
}

async function ratios(all: Checked[], ours: Simulate, peer: Simulate, count = TIMED): Promise<string> {
  const found: string[] = [];
  for (const { kind, travels } of all) {
    const timed = travels.slice(0, count);
    const { ratio } = await compare(
      () => timed.forEach(ours),
      () => timed.forEach(peer),
    );
    found.push(`${kind} ${times(ratio)}`);
  }
  return found.join(', ');
}

/** One draw of an example in which both vehicles are simulated. */
interface Inversion {
  target: Target;
  spin: SpinSlots;
  body: VehicleState;
}

function inversions(count: number): Inversion[] {
  const parsed = parseCase(readFileSync('public/examples/nudge.case.json'));
  if (!parsed.ok) throw new Error('the example is not valid');
  const { problem } = solveCentral(readEvidence(parsed.casefile, 'directions', 1));
  const kernel = new Kernel(problem);
  kernel.draw(0, count);
  return VEHICLE_IDS.flatMap((id) => {
    const slots = problem.vehicles[id];
    const spin = slots.departure;
    if (spin.kind !== 'spin') throw new Error('the example does not simulate its travel');
    return Array.from({ length: count }, (_, k) => {
      const body = { ...kernel.loadBody(k, slots, kernel.state[id]) };
      const from = { x: body.x, y: body.y, heading: kernel.inputs[slots.heading][k] };
      return { target: targetOf(kernel.inputs, k, slots, spin, body, { from, elapsed: 0 }, DRAW_ERROR), spin, body };
    });
  });
}

/** A draw's search for its separation against one simulation from what it finds. */
async function perInversion(): Promise<Line> {
  const all = inversions(1000);
  const found = all.filter(({ target, spin, body }) => separateDraw(target, spin, body));
  const simulate = ({ target, body }: Inversion) => missOf(target, [body.vx, body.vy, body.wMeasured]);
  if (found.length < 0.95 * all.length) throw new Error(`only ${found.length} of ${all.length} draws met their pose`);
  for (const one of found)
    if (!(simulate(one).size < MILLIMETRE)) throw new Error('a separation does not lead to its rest pose');
  const { ours, peer } = await compare(
    () => found.forEach(({ target, spin, body }) => separateDraw(target, spin, body)),
    () => found.forEach(simulate),
  );
  return {
    id: 'G9',
    what: `finding a separation from a rest pose in a draw, in simulations (${found.length} of ${all.length} draws met)`,
    goal: '<= 4',
    found: (ours / peer).toFixed(2),
  };
}

export async function simulatedTravel(): Promise<Line[]> {
  const all = KINDS.map(checked);
  const braked = all.filter(({ kind }) => kind !== 'free rolling');
  return [
    {
      id: 'G6',
      what: 'to rest in a draw, against odex 1e-6',
      goal: '>= 4',
      found: await ratios(all, ofDraw, odex(1e-6)),
    },
    {
      id: 'G7',
      what: 'the same, against ode45-cash-karp 1e-6',
      goal: '>= 2.3',
      found: await ratios(braked, ofDraw, cashKarp('own')),
    },
    {
      id: 'G7',
      what: 'the same, with an absolute tolerance of 1e-6',
      goal: 'none',
      found: await ratios(braked, ofDraw, cashKarp('absolute')),
    },
    {
      id: 'G8',
      what: 'to rest in a central answer, each of 2,000 within 1 mm and 0.05 degrees, against odex 1e-8',
      goal: '>= 2.5',
      found: await ratios(all, ofCentral, odex(1e-8), 100),
    },
    await perInversion(),
  ];
}
