import { VEHICLE_IDS, type VehicleId } from '@/lib/casefile/schema';
import type { Problem } from '@/lib/evidence/problem';
import { travelSlots } from '@/lib/evidence/travel-slots';
import { type FigureName, columnOf } from './columns';
import { BLOCK, Kernel } from './kernel';

/** First-order and total index of one input, per figure. */
export interface SobolIndices {
  slot: number;
  first: number[];
  total: number[];
}

/** Two independent sets of streams, apart from those of the draws. */
const SET_A = ' (set A)';
const SET_B = ' (set B)';

/**
 * First-order and total Sobol' indices of the given inputs by the estimators of Jansen (1999): with f(A), f(B) of two
 * independent sets of draws and f(AB) of set A with the one input taken from B,
 *   first = 1 - mean (f(B) - f(AB))^2 / 2V,   total = mean (f(A) - f(AB))^2 / 2V.
 * Rows where any of the three is an impossible draw are left out. `rows` draws of each set.
 */
export function sobolIndices(
  problem: Problem,
  slots: readonly number[],
  rows: number,
  figures: FigureName[],
): SobolIndices[] {
  const [a, b, ab] = [new Kernel(problem), new Kernel(problem), new Kernel(problem)];
  a.inputs.forEach((column, slot) => (ab.inputs[slot] = column));
  const sums = slots.map(() => figures.map(() => new Sums()));
  const travel = { A: travelSlots(problem.vehicles.A), B: travelSlots(problem.vehicles.B) };
  for (let block = 0; block * BLOCK < rows; block++) {
    const count = Math.min(BLOCK, rows - block * BLOCK);
    a.draw(block, count, SET_A);
    b.draw(block, count, SET_B);
    a.solve(count);
    b.solve(count);
    slots.forEach((slot, s) => {
      ab.inputs[slot] = b.inputs[slot];
      for (const id of VEHICLE_IDS) if (!travel[id].has(slot) && isApart(problem, id)) ab.keepTravel(id, a);
      ab.solve(count);
      ab.forgetTravel();
      ab.inputs[slot] = a.inputs[slot];
      figures.forEach((name, f) => addRows(sums[s][f], count, rowsOf(a, name), rowsOf(b, name), rowsOf(ab, name)));
    });
  }
  return slots.map((slot, s) => ({
    slot,
    first: sums[s].map((sum) => sum.first()),
    total: sums[s].map((sum) => sum.total()),
  }));
}

/** Whether the travel of a vehicle hangs on its own inputs alone: a contact that lasts decides where a simulated one begins. */
const isApart = ({ lasting, vehicles }: Problem, id: VehicleId): boolean =>
  lasting === null || vehicles[id].departure.kind === 'legs';

const rowsOf = (kernel: Kernel, name: FigureName) => ({
  values: columnOf(kernel.columns, name),
  reasons: kernel.reasons,
});

type FigureRows = ReturnType<typeof rowsOf>;

function addRows(sums: Sums, count: number, a: FigureRows, b: FigureRows, ab: FigureRows): void {
  for (let k = 0; k < count; k++)
    if (a.reasons[k] === 0 && b.reasons[k] === 0 && ab.reasons[k] === 0)
      sums.add(a.values[k], b.values[k], ab.values[k]);
}

/** Running sums for one input and one figure. */
class Sums {
  private n = 0;
  private mean = 0;
  private squares = 0;
  private fromB = 0;
  private fromA = 0;

  add(a: number, b: number, ab: number): void {
    this.addToVariance(a);
    this.addToVariance(b);
    this.fromB += (b - ab) * (b - ab);
    this.fromA += (a - ab) * (a - ab);
  }

  /** Welford's update. */
  private addToVariance(x: number): void {
    this.n++;
    const step = x - this.mean;
    this.mean += step / this.n;
    this.squares += step * (x - this.mean);
  }

  private share(differences: number): number {
    const variance = this.squares / (this.n - 1);
    const rows = this.n / 2;
    return differences / (2 * rows * variance);
  }

  first = (): number => 1 - this.share(this.fromB);
  total = (): number => this.share(this.fromA);
}
