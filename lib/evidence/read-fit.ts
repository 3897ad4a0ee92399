import type { CaseFile, Quantity, VehicleId } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import { obliqueFactor, stripWork } from '@/lib/mechanics/crush';
import { legStartSpeedSquared } from '@/lib/mechanics/legs';
import { cos } from '@/lib/numerics/elementary';
import { meanAndSd } from '@/lib/numerics/quantile';
import { fillBlock, meanOf, standardUncertainty } from '@/lib/numerics/spread';
import { InputList, inputOf } from './input-list';
import type { DamageSlots, FitSlots, Input, LegsSlots, Observation, Observed } from './problem';
import { readDamage, readLegs } from './read-vehicle';

/** Approach speeds of which nothing is known: flat up to this, m/s (contract of the model). */
const FASTEST = 45;
/** Spread of the slip where neither a direction nor a slip is stated, deg. */
const SLIP_SD = 1;
/** Draws that a mean and a standard uncertainty of legs or damage are propagated over, in blocks. */
const BLOCKS = 100;
const BLOCK = 1000;

const flat = (low: number, high: number): Quantity => ({
  value: (low + high) / 2,
  spread: { shape: 'rectangular', low, high },
});

/** The unknowns of a fit beyond the vehicles, with what is known of them beforehand, and all its observations. */
export function readFit(list: InputList, casefile: CaseFile, seed: number): FitSlots {
  const { impact, approach } = casefile;
  const speed = (id: VehicleId) => list.si(`approach.${id}.speed`, approach[id].speed ?? flat(0, FASTEST));
  const direction = (id: VehicleId): FitSlots['direction']['A'] => {
    const stated = approach[id].direction;
    if (stated) return { slot: list.angle(`approach.${id}.direction`, stated), fromHeading: false };
    const slip: Quantity = approach[id].slip ?? { value: 0, spread: { shape: 'normal', sd: SLIP_SD } };
    return { slot: list.angle(`approach.${id}.slip`, slip), fromHeading: true };
  };
  return {
    speed: { A: speed('A'), B: speed('B') },
    direction: { A: direction('A'), B: direction('B') },
    restitution: list.si('impact.restitution', impact.restitution ?? flat(0, 1)),
    friction: list.si('impact.friction', impact.friction ?? flat(0, 1.5)),
    observations: observationsOf(casefile, seed),
  };
}

/** One quantity as an observation; none where it is not stated. */
function observed(
  path: string,
  of: Observed,
  q: Quantity | null | undefined,
  unit: 'si' | 'angle' = 'si',
): Observation[] {
  if (!q) return [];
  const { value, spread } = inputOf(path, q, unit === 'angle' ? Math.PI / 180 : 1);
  return [{ path, of, value: meanOf(value, spread), sd: standardUncertainty(value, spread) }];
}

function observationsOf(casefile: CaseFile, seed: number): Observation[] {
  const { recorded, restOffset, impact, analysis } = casefile;
  return [
    ...VEHICLE_IDS.flatMap((id) => travelObservations(casefile, id, seed)),
    ...VEHICLE_IDS.flatMap((id) => [
      ...observed(`recorded.${id}.forward`, `${id}.deltaVForward`, recorded?.[id]?.forward),
      ...observed(`recorded.${id}.left`, `${id}.deltaVLeft`, recorded?.[id]?.left),
    ]),
    ...observed('restOffset.x', 'offset.x', restOffset?.x),
    ...observed('restOffset.y', 'offset.y', restOffset?.y),
    ...observed('restOffset.heading', 'offset.heading', restOffset?.heading, 'angle'),
    ...(analysis.contact === 'lasting' ? observed('impact.slide', 'slide', impact.slide) : []),
    ...damageObservation(casefile, seed),
  ];
}

function travelObservations(casefile: CaseFile, id: VehicleId, seed: number): Observation[] {
  const departure = casefile.departure[id];
  const at = `departure.${id}`;
  if (!departure) return [];
  if (departure.kind === 'spin')
    return [
      ...observed(`${at}.rest.x`, `${id}.restX`, departure.rest.x),
      ...observed(`${at}.rest.y`, `${id}.restY`, departure.rest.y),
      ...observed(`${at}.rest.heading`, `${id}.restHeading`, departure.rest.heading, 'angle'),
    ];
  const list = new InputList();
  const legs = readLegs(list, departure, at);
  const speeds = propagated(list.inputs, seed, (inputs, k) => separationSpeed(inputs, k, legs));
  return [
    { path: `${at}.legs`, of: `${id}.departureSpeed`, value: speeds.mean, sd: speeds.sd },
    ...observed(`${at}.direction`, `${id}.departureDirection`, departure.direction, 'angle'),
    ...observed(`${at}.yawRate`, `${id}.departureYawRate`, departure.yawRate, 'angle'),
  ];
}

/** The speed at the start of the legs, m/s; NaN where one has none. */
function separationSpeed(inputs: Float64Array[], k: number, { legs, endSpeed }: LegsSlots): number {
  let squared = inputs[endSpeed][k] ** 2;
  for (const { distance, friction, share, grade } of legs.toReversed())
    if (squared >= 0)
      squared = legStartSpeedSquared(
        squared,
        inputs[distance][k],
        inputs[friction][k],
        inputs[share][k],
        inputs[grade][k],
      );
  return squared >= 0 ? Math.sqrt(squared) : NaN;
}

/** Mean and standard uncertainty of a figure of some inputs over their draws; impossible ones (NaN) are left out. */
function propagated(inputs: Input[], seed: number, figure: (drawn: Float64Array[], k: number) => number) {
  const drawn = inputs.map((input) => {
    const column = new Float64Array(BLOCKS * BLOCK);
    for (let b = 0; b < BLOCKS; b++)
      fillBlock(column.subarray(b * BLOCK, (b + 1) * BLOCK), BLOCK, input, seed, `${input.path} (evidence)`, b);
    return column;
  });
  const values = new Float64Array(BLOCKS * BLOCK);
  let n = 0;
  for (let k = 0; k < values.length; k++) {
    const value = figure(drawn, k);
    if (!Number.isNaN(value)) values[n++] = value;
  }
  return meanAndSd(values.subarray(0, n));
}

/** The sum of both crush energies where both are given; an upper limit where neither has any depth. */
function damageObservation({ damage }: CaseFile, seed: number): Observation[] {
  const [A, B] = [damage?.A, damage?.B];
  if (!A || !B) return [];
  const list = new InputList();
  const slots = [readDamage(list, A, 'damage.A', true), readDamage(list, B, 'damage.B', true)].flatMap((d) => d ?? []);
  const { mean, sd } = propagated(list.inputs, seed, (inputs, k) =>
    slots.reduce((sum, each) => sum + crushEnergy(inputs, k, each), 0),
  );
  const none = [A, B].every(({ depths }) => depths.every(({ value }) => value === 0));
  return [{ path: 'damage', of: none ? 'energyBelow' : 'energyLost', value: mean, sd }];
}

function crushEnergy(
  inputs: Float64Array[],
  k: number,
  { depths, strips, width, a, b, forceAngle }: DamageSlots,
): number {
  const work = strips.reduce(
    (sum, strip, i) =>
      sum +
      stripWork(strip * inputs[width][k], inputs[depths[i]][k], inputs[depths[i + 1]][k], inputs[a][k], inputs[b][k]),
    0,
  );
  return work * obliqueFactor(cos(inputs[forceAngle][k]));
}
