import Decimal from 'decimal.js';
import type { Dimension, UnitSystem } from './dimension';
import { type Unit, unitOf, unitSpelled, unitsFor } from './unit';

/** What a person typed, read. Values are SI, angles in degrees. */
export type Entry =
  | { ok: true; value: number; spread?: EntrySpread }
  /** Why it could not be read, and what would be right. */
  | { ok: false; says: string };

export type EntrySpread = { shape: 'normal'; sd: number } | { shape: 'rectangular'; low: number; high: number };

const PLUS_MINUS = /\s*(?:±|\+\/-|\+-)\s*/;
const RANGE = /\s*(?:\.\.\.?|…|\bto\b)\s*/;

/**
 * Reads «0.7 ± 0.05», «35 mph», «12 ft 6 in», «5 1/2 in», «0.65..0.75», «1 450 kg», «3,5», «1420 ± 2 %» for a quantity of
 * a dimension. A number without a unit is in the unit shown by `system`. Decimal comma or point; conversion in decimals.
 */
export function parseEntry(text: string, dimension: Dimension, system: UnitSystem): Entry {
  const clean = text
    .replaceAll('\u2212', '-')
    .replaceAll('\u2013', '-')
    .replaceAll(/[\u00a0\u202f\u2009]/g, ' ')
    .trim();
  if (clean === '') return { ok: false, says: `nothing was entered; write a number${inWhat(dimension, system)}` };
  try {
    const [main, spread, ...more] = clean.split(PLUS_MINUS);
    if (more.length > 0) throw new Unreadable('± stands twice');
    if (spread !== undefined) return withSpread(main, spread, dimension, system);
    const dashed = DASHED.exec(clean);
    if (dashed) throw new Unreadable(`«${clean}» may be a range: write it as ${dashed[1]}..${dashed[2]}`);
    const ends = clean.split(RANGE);
    if (ends.length === 2) return fromRange(ends[0], ends[1], dimension, system);
    return { ok: true, value: read(clean, dimension, system).toNumber() };
  } catch (error) {
    if (error instanceof Unreadable) return { ok: false, says: error.message };
    throw error;
  }
}

/** Two figures with a dash between them. */
const DASHED = /^([\d.,]+)\s*-\s*([\d.,]+)$/;

class Unreadable extends Error {}

const inWhat = (dimension: Dimension, system: UnitSystem): string => {
  const { name } = unitOf(dimension, system);
  return dimension === 'ratio' ? '' : ` in ${name}`;
};

function withSpread(main: string, spread: string, dimension: Dimension, system: UnitSystem): Entry {
  const shared = trailingUnit(spread);
  const sharesUnit = shared !== '' && shared !== '%' && trailingUnit(main) === '';
  const value = read(sharesUnit ? `${main} ${shared}` : main, dimension, system);
  const size =
    spread.endsWith('%') && dimension !== 'ratio'
      ? read(spread, 'ratio', system).times(value.abs())
      : read(withUnitOf(main, spread), dimension, system);
  if (!size.gt(0)) throw new Unreadable('the spread after ± must be greater than 0');
  return { ok: true, value: value.toNumber(), spread: { shape: 'normal', sd: size.toNumber() } };
}

/** The unit words at the end of a text. */
const trailingUnit = (text: string): string => /[^\d\s.,/][^\d\s]*$/.exec(text.trim())?.[0] ?? '';

/** A second figure without a unit takes that of the first. */
const withUnitOf = (first: string, second: string): string =>
  trailingUnit(second) === '' && trailingUnit(first) !== '' ? `${second} ${trailingUnit(first)}` : second;

function fromRange(from: string, to: string, dimension: Dimension, system: UnitSystem): Entry {
  const high = read(withUnitOf(from, to), dimension, system);
  const low = read(
    trailingUnit(from) === '' && trailingUnit(to) !== '' ? `${from} ${trailingUnit(to)}` : from,
    dimension,
    system,
  );
  if (!low.lt(high)) throw new Unreadable('the first end of a range must be the smaller one');
  const spread = { shape: 'rectangular', low: low.toNumber(), high: high.toNumber() } as const;
  return { ok: true, value: low.plus(high).div(2).toNumber(), spread };
}

const NUMBER = String.raw`(?:\d{1,3}(?: \d{3})+(?!\d)|\d+)(?:[.,]\d+)*|[.,]\d+`;
const FRACTION = String.raw`\d+\s*/\s*\d+`;
/** A number, perhaps with a fraction, and the unit behind it. */
const PIECE = new RegExp(
  String.raw`^\s*(?:(${FRACTION})|(${NUMBER})(?:\s+(${FRACTION}))?(e[+-]?\d+)?)\s*([^\d\s.,+-][^\d]*?)?\s*(?=[\d.,]|$)`,
  'i',
);

/** One figure, perhaps of several parts as in 12 ft 6 in, in SI. */
function read(text: string, dimension: Dimension, system: UnitSystem): Decimal {
  const sign = /^\s*([+-])/.exec(text)?.[1] ?? '';
  let rest = text.trim().slice(sign.length).trim();
  if (rest === '') throw new Unreadable(`write a number${inWhat(dimension, system)}`);
  let sum = new Decimal(0);
  let finer: Unit | undefined;
  while (rest !== '') {
    const piece = PIECE.exec(rest);
    if (!piece) throw new Unreadable(`«${text.trim()}» is not a number${inWhat(dimension, system)}`);
    const [whole, fractionAlone, figure, fraction, exponent, spelling] = piece;
    const found = unitFor(spelling?.trim(), dimension, system);
    if (finer && !found.factor.lt(finer.factor))
      throw new Unreadable(`«${text.trim()}» has its units in the wrong order`);
    finer = found;
    let value = fractionAlone ? ratio(fractionAlone) : number(figure);
    if (fraction) value = value.plus(ratio(fraction));
    if (exponent) value = value.times(new Decimal(`1${exponent}`));
    sum = sum.plus(value.times(found.factor));
    rest = rest.slice(whole.length).trim();
  }
  return sign === '-' ? sum.neg() : sum;
}

function unitFor(spelling: string | undefined, dimension: Dimension, system: UnitSystem): Unit {
  if (!spelling) return unitOf(dimension, system);
  const found = unitSpelled(dimension, spelling.replaceAll(/\s+/g, ' '));
  if (found) return found;
  const known = unitsFor(dimension, system)
    .map(({ symbol }) => symbol)
    .filter((symbol) => symbol !== '');
  throw new Unreadable(
    known.length === 0
      ? `«${spelling}» is no unit here: write a plain number`
      : `«${spelling}» is no unit known here: write ${known.join(', ')}`,
  );
}

/** A figure with a decimal point or comma, and spaces between thousands. */
function number(text: string): Decimal {
  const plain = text.replaceAll(' ', '');
  const marks = plain.replaceAll(/[^.,]/g, '');
  if (/^\d{1,3},\d{3}$/.test(plain))
    throw new Unreadable(
      `«${text}» can be read as ${plain.replace(',', '')} or ${plain.replace(',', '.')}: write it without a comma`,
    );
  if (marks.length > 1)
    throw new Unreadable(`«${text}» has more than one decimal mark: write thousands with a space or none`);
  return new Decimal(plain.replace(',', '.'));
}

function ratio(text: string): Decimal {
  const [over, under] = text.split('/').map((part) => new Decimal(part.trim()));
  if (under.isZero()) throw new Unreadable(`«${text}» divides by zero`);
  return over.div(under);
}
