import Decimal from 'decimal.js';
import type { Dimension, UnitSystem } from './dimension';

/**
 * The units that are read and shown. Factors to SI are exact by definition (NIST SP 811, appendix B), kept as decimals
 * so that 12 ft 6 in is exactly 3.81 m.
 */
export interface Unit {
  symbol: string;
  name: string;
  /** SI value of one of it (angles: degrees, yaw rates: degrees per second). */
  factor: Decimal;
  /** Other spellings that are read. */
  spellings: readonly string[];
}

const unit = (symbol: string, name: string, factor: Decimal.Value, ...spellings: string[]): Unit => ({
  symbol,
  name,
  factor: new Decimal(factor),
  spellings,
});

const FOOT = new Decimal('0.3048');
const INCH = new Decimal('0.0254');
const MILE = new Decimal('1609.344');
const POUND = new Decimal('0.45359237');
const GRAVITY = new Decimal('9.80665');
const POUND_FORCE = POUND.times(GRAVITY);
/** Degrees per radian, to more digits than a double has. */
const RADIAN = new Decimal('57.29577951308232087679815481410517');

const UNITS: Record<Dimension, readonly Unit[]> = {
  length: [
    unit('m', 'metres', 1, 'metre', 'metres', 'meter', 'meters'),
    unit('cm', 'centimetres', '0.01'),
    unit('mm', 'millimetres', '0.001'),
    unit('ft', 'feet', FOOT, "'", '′', 'foot', 'feet'),
    unit('in', 'inches', INCH, '"', '″', 'inch', 'inches'),
    unit('yd', 'yards', FOOT.times(3), 'yard', 'yards'),
  ],
  angle: [unit('°', 'degrees', 1, 'deg', 'degree', 'degrees'), unit('rad', 'radians', RADIAN, 'radian', 'radians')],
  mass: [
    unit('kg', 'kilograms', 1, 'kilogram', 'kilograms'),
    unit('t', 'tonnes', 1000, 'tonne', 'tonnes'),
    unit('lb', 'pounds', POUND, 'lbs', 'pound', 'pounds'),
  ],
  yawInertia: [
    unit('kg·m²', 'kilogram square metres', 1, 'kgm2', 'kgm^2', 'kg·m2', 'kg·m^2', 'kgm²', 'kg m²', 'kg m2', 'kg m^2'),
    unit(
      'slug·ft²',
      'slug square feet',
      POUND_FORCE.times(FOOT),
      'slugft2',
      'slug·ft2',
      'slug ft2',
      'slug ft²',
      'lb·ft·s²',
      'lbfts2',
    ),
  ],
  speed: [
    unit('m/s', 'metres per second', 1, 'mps'),
    unit('km/h', 'kilometres per hour', new Decimal(1).div('3.6'), 'kmh', 'kph'),
    unit('mph', 'miles per hour', MILE.div(3600), 'mi/h'),
    unit('ft/s', 'feet per second', FOOT, 'fps'),
  ],
  yawRate: [unit('°/s', 'degrees per second', 1, 'deg/s'), unit('rad/s', 'radians per second', RADIAN)],
  ratio: [unit('', 'ratio', 1), unit('%', 'per cent', '0.01', 'percent')],
  time: [unit('s', 'seconds', 1, 'sec', 'second', 'seconds'), unit('ms', 'milliseconds', '0.001')],
  acceleration: [unit('m/s²', 'metres per second squared', 1, 'm/s2', 'm/s^2'), unit('g', 'standard gravity', GRAVITY)],
  energy: [
    unit('J', 'joules', 1),
    unit('kJ', 'kilojoules', 1000),
    unit('ft·lbf', 'foot pounds-force', POUND_FORCE.times(FOOT), 'ftlbf', 'ft-lbf', 'ft-lb'),
  ],
  impulse: [unit('N·s', 'newton seconds', 1, 'Ns'), unit('lbf·s', 'pound-force seconds', POUND_FORCE, 'lbfs', 'lb·s')],
  forcePerWidth: [
    unit('N/m', 'newtons per metre', 1),
    unit('kN/m', 'kilonewtons per metre', 1000),
    unit('lbf/in', 'pounds-force per inch', POUND_FORCE.div(INCH), 'lb/in'),
  ],
  stiffnessPerWidth: [
    unit('N/m²', 'newtons per square metre', 1, 'N/m2', 'N/m^2', 'Pa'),
    unit('kN/m²', 'kilonewtons per square metre', 1000, 'kN/m2', 'kN/m^2', 'kPa'),
    unit('lbf/in²', 'pounds-force per square inch', POUND_FORCE.div(INCH.times(INCH)), 'lb/in2', 'lb/in²', 'psi'),
  ],
};

/** The unit that a dimension is shown in, by display system. */
const SHOWN: Record<UnitSystem, Record<Dimension, string>> = {
  metric: {
    length: 'm',
    angle: '°',
    mass: 'kg',
    yawInertia: 'kg·m²',
    speed: 'km/h',
    yawRate: '°/s',
    ratio: '',
    time: 's',
    acceleration: 'm/s²',
    energy: 'kJ',
    impulse: 'N·s',
    forcePerWidth: 'kN/m',
    stiffnessPerWidth: 'kN/m²',
  },
  us: {
    length: 'ft',
    angle: '°',
    mass: 'lb',
    yawInertia: 'slug·ft²',
    speed: 'mph',
    yawRate: '°/s',
    ratio: '',
    time: 's',
    acceleration: 'g',
    energy: 'ft·lbf',
    impulse: 'lbf·s',
    forcePerWidth: 'lbf/in',
    stiffnessPerWidth: 'lbf/in²',
  },
};

export function unitOf(dimension: Dimension, system: UnitSystem): Unit {
  const symbol = SHOWN[system][dimension];
  return UNITS[dimension].find((u) => u.symbol === symbol) as Unit;
}

/** All units read for a dimension, the shown one first. */
export function unitsFor(dimension: Dimension, system: UnitSystem): Unit[] {
  const shown = unitOf(dimension, system);
  return [shown, ...UNITS[dimension].filter((u) => u !== shown)];
}

/** The unit of a dimension that is spelled so, case included first, then without; undefined where there is none. */
export function unitSpelled(dimension: Dimension, spelling: string): Unit | undefined {
  const all = UNITS[dimension];
  const spelled = (u: Unit): string[] => [u.symbol, ...u.spellings];
  return (
    all.find((u) => spelled(u).includes(spelling)) ??
    all.find((u) => spelled(u).some((s) => s.toLowerCase() === spelling.toLowerCase()))
  );
}
