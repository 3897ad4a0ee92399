import { supportOf } from '@/lib/casefile/quantities';
import type { Quantity } from '@/lib/casefile/schema';
import type { DrawSpread } from '@/lib/numerics/spread';
import type { Input, Slot } from './problem';

const RADIANS_PER_DEGREE = Math.PI / 180;

/** Gathers the inputs of a problem; every quantity that is read gets a slot. The only place where degrees become radians. */
export class InputList {
  readonly inputs: Input[] = [];

  add(input: Input): Slot {
    return this.inputs.push(input) - 1;
  }

  /** A quantity that the case file states in SI. */
  si(path: string, quantity: Quantity): Slot {
    return this.add(inputOf(path, quantity, 1));
  }

  /** A quantity that the case file states in degrees, or degrees per second. */
  angle(path: string, quantity: Quantity): Slot {
    return this.add(inputOf(path, quantity, RADIANS_PER_DEGREE));
  }

  /** As si, for a quantity that several parts of the problem use: one input, one slot. */
  shared(path: string, quantity: Quantity): Slot {
    const known = this.inputs.findIndex((input) => input.path === path);
    return known >= 0 ? known : this.si(path, quantity);
  }

  /** As si, where the case states the quantity. */
  siIf(path: string, quantity: Quantity | null | undefined): Slot | null {
    return quantity ? this.si(path, quantity) : null;
  }

  /** As angle, where the case states the quantity. */
  angleIf(path: string, quantity: Quantity | null | undefined): Slot | null {
    return quantity ? this.angle(path, quantity) : null;
  }
}

export const inputOf = (path: string, quantity: Quantity, factor: number): Input => ({
  path,
  value: quantity.value * factor,
  spread: spreadOf(quantity, factor),
  support: supportOf(path),
});

function spreadOf({ spread }: Quantity, factor: number): DrawSpread {
  if (!spread || spread.shape === 'fixed') return { shape: 'fixed' };
  if (spread.shape === 'normal') return { shape: 'normal', sd: spread.sd * factor };
  return { shape: spread.shape, low: spread.low * factor, high: spread.high * factor };
}
