import type { CaseFile } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import { formatValue, formatWithUnit } from '@/lib/units/format';
import { stated, unitsOf } from './numbers';
import type { Row, Section } from './report';
import { failuresOf } from './failures';

interface Bound {
  what: string;
  range: string;
  here: string;
  inside: boolean | null;
}

/** Screening values: chosen here, not published limits. SI. */
const CLOSING = { low: 0.5, high: 10 };
const MASS = { low: 600, high: 5000 };
const TYRE_SHARE = 0.1;
const SLIDING_RATIO = 3;
const SINE_BETWEEN = 0.17;
const PULSE = { low: 0.05, high: 0.3 };
const GRADE = 0.1;

const WHOLE = { decimals: 0 };

/** The range of validity of the models, and where this case lies in it. */
export function domainSection(casefile: CaseFile, result: Result): Section {
  const bounds = boundsOf(casefile, result);
  const rows: Row[] = bounds.map(({ what, range, here, inside }) => ({
    cells: [what, range, here, inside === null ? '–' : inside ? 'inside' : 'OUTSIDE'],
  }));
  return {
    id: 'domain',
    title: 'Limits: where the models hold',
    blocks: [
      {
        kind: 'paragraph',
        text: 'Not covered at all: rollover, steep changes of crossfall, articulated units at impact, motorcycles, pedestrians, trips over poles or kerbs, three vehicles in contact at once, deformation or over-ride beyond the range above.',
      },
      {
        kind: 'table',
        caption: 'Range of validity; the limits are screening values chosen for this program, not published limits',
        columns: [
          { title: 'Quantity', kind: 'words' },
          { title: 'Range of the models', kind: 'words' },
          { title: 'This case', kind: 'words' },
          { title: 'Lies', kind: 'words' },
        ],
        rows,
      },
    ],
  };
}

const within = (value: number, { low, high }: { low: number; high: number }): boolean => value >= low && value <= high;

function boundsOf(casefile: CaseFile, result: Result): Bound[] {
  return [closingBound, slidingBound, angleBound, massBound, gradeBound, tyreBound, pulseBound, contactsBound].flatMap(
    (bound) => bound(casefile, result) ?? [],
  );
}

type BoundRule = (casefile: CaseFile, result: Result) => Bound | null;

const closingBound: BoundRule = (casefile, result) => {
  const units = unitsOf(casefile);
  const speed = result.central.closingSpeed;
  const shown = (si: number): string => formatWithUnit(si, 'speed', units, { decimals: 1 });
  const withheld = failuresOf(result).length > 0 || speed === undefined;
  return {
    what: 'Closing speed along the normal',
    range: `${formatValue(CLOSING.low, 'speed', units, { decimals: 1 })} to ${shown(CLOSING.high)}`,
    here: withheld ? 'withheld' : shown(speed),
    inside: withheld ? null : within(speed, CLOSING),
  };
};

const slidingBound: BoundRule = (_, result) => {
  const { closingSpeed, slidingSpeed } = result.central;
  if (!closingSpeed || slidingSpeed === undefined || failuresOf(result).length > 0) return null;
  const ratio = Math.abs(slidingSpeed / closingSpeed);
  return {
    what: 'Sliding over closing speed',
    range: `up to ${SLIDING_RATIO}`,
    here: ratio.toFixed(2),
    inside: ratio <= SLIDING_RATIO,
  };
};

const angleBound: BoundRule = (_, result) => {
  const sine = result.more.sinBetween;
  if (result.method !== 'directions' || sine === undefined) return null;
  return {
    what: 'Sine of the angle between the approaches',
    range: `${SINE_BETWEEN} or more (about 10°)`,
    here: Math.abs(sine).toFixed(2),
    inside: Math.abs(sine) >= SINE_BETWEEN,
  };
};

const massBound: BoundRule = (casefile) => {
  const units = unitsOf(casefile);
  const masses = VEHICLE_IDS.map((id) => casefile.vehicles[id].mass.value);
  return {
    what: 'Masses of A and B',
    range: `${formatValue(MASS.low, 'mass', units, WHOLE)} to ${formatWithUnit(MASS.high, 'mass', units, WHOLE)}`,
    here: `${formatValue(masses[0], 'mass', units, WHOLE)} and ${formatWithUnit(masses[1], 'mass', units, WHOLE)}`,
    inside: masses.every((mass) => within(mass, MASS)),
  };
};

const gradeBound: BoundRule = (casefile) => {
  const grades = VEHICLE_IDS.flatMap((id) => {
    const departure = casefile.departure[id];
    return departure?.kind === 'legs' ? departure.legs.map((leg) => Math.abs(leg.grade.value)) : [];
  });
  if (grades.length === 0) return null;
  const steepest = Math.max(...grades);
  return {
    what: 'Steepest grade of a leg',
    range: `up to ${GRADE}`,
    here: stated(steepest, 'ratio', 'metric'),
    inside: steepest <= GRADE,
  };
};

const tyreBound: BoundRule = (_, result) => {
  const share = result.more.tyreShare;
  if (share === undefined) return null;
  return {
    what: 'Tyre impulse over contact impulse (upper bound)',
    range: `up to ${TYRE_SHARE}`,
    here: share.toFixed(2),
    inside: share <= TYRE_SHARE,
  };
};

const pulseBound: BoundRule = (casefile) => {
  if (!casefile.pulse) return null;
  const T = casefile.pulse.value;
  return {
    what: 'Contact duration',
    range: `${PULSE.low} to ${PULSE.high} s`,
    here: `${stated(T, 'time', 'metric')} s`,
    inside: within(T, PULSE),
  };
};

const contactsBound: BoundRule = () => ({ what: 'Number of contacts', range: '1', here: '1, as drawn', inside: true });
