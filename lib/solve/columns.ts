import type { Problem } from '@/lib/evidence/problem';

/** The figures that the kernel writes for each vehicle and for the pair. SI and radians. */
const VEHICLE_FIGURES = [
  'approachSpeed',
  'approachDirection',
  'approachYawRate',
  'departureSpeed',
  'departureDirection',
  'departureYawRate',
  'deltaV',
  'deltaVForward',
  'deltaVLeft',
  'deltaVDirection',
  'meanAcceleration',
  /** Crush energy of the vehicle. */
  'damageEnergy',
  /** Yaw rate after contact that the impulse predicts; held against the measured one. */
  'predictedYawRate',
  /** Change of the yaw rate, for the seats. */
  'yawRateChange',
] as const;

const PAIR_FIGURES = [
  'closingSpeed',
  'slidingSpeed',
  'restitution',
  'impulseRatio',
  'impulse',
  'energyLost',
  'damageClosingSpeed',
] as const;

export type VehicleFigure = (typeof VEHICLE_FIGURES)[number];
export type PairFigure = (typeof PAIR_FIGURES)[number];
export type FigureName = `A.${VehicleFigure}` | `B.${VehicleFigure}` | PairFigure;

export type VehicleColumns = Record<VehicleFigure, Float64Array>;
export type Columns = Record<PairFigure, Float64Array> & Record<'A' | 'B', VehicleColumns>;

export function makeColumns(length: number): Columns {
  const fresh = <K extends string>(keys: readonly K[]) =>
    Object.fromEntries(keys.map((key) => [key, new Float64Array(length)])) as Record<K, Float64Array>;
  return { ...fresh(PAIR_FIGURES), A: fresh(VEHICLE_FIGURES), B: fresh(VEHICLE_FIGURES) };
}

/** The figures that a problem has: no mean acceleration without a contact duration, no damage energy without depths. */
export function figuresOf(problem: Problem): FigureName[] {
  const { A, B } = problem.vehicles;
  const has = (figure: string): boolean => {
    if (figure.endsWith('meanAcceleration')) return problem.pulse !== null;
    if (figure === 'damageClosingSpeed') return (A.damage ?? B.damage) !== null;
    if (figure.endsWith('damageEnergy')) return (figure.startsWith('A') ? A : B).damage !== null;
    return true;
  };
  const all: FigureName[] = [
    ...VEHICLE_FIGURES.map((key) => `A.${key}` as const),
    ...VEHICLE_FIGURES.map((key) => `B.${key}` as const),
    ...PAIR_FIGURES,
  ];
  return all.filter(has);
}

export function columnOf(columns: Columns, name: FigureName): Float64Array {
  const [first, second] = name.split('.') as [string, VehicleFigure | undefined];
  return second === undefined ? columns[first as PairFigure] : columns[first as 'A' | 'B'][second];
}
