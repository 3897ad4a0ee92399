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
  /** Yaw rate after contact that the impulse predicts; held against the measured one. */
  'predictedYawRate',
  /** Change of the yaw rate, for the seats. */
  'yawRateChange',
] as const;

const PAIR_FIGURES = ['closingSpeed', 'slidingSpeed', 'restitution', 'impulseRatio', 'impulse', 'energyLost'] as const;

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

/** The figures that a problem has: no mean acceleration without a contact duration. */
export function figuresOf(problem: Problem): FigureName[] {
  const vehicle = VEHICLE_FIGURES.filter((key) => key !== 'meanAcceleration' || problem.pulse !== null);
  return [...vehicle.map((key) => `A.${key}` as const), ...vehicle.map((key) => `B.${key}` as const), ...PAIR_FIGURES];
}

export function columnOf(columns: Columns, name: FigureName): Float64Array {
  const [first, second] = name.split('.') as [string, VehicleFigure | undefined];
  return second === undefined ? columns[first as PairFigure] : columns[first as 'A' | 'B'][second];
}
