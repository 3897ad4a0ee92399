import type { VehicleId } from '@/lib/casefile/schema';
import type { Shapes } from '@/lib/results/bands';
import { resultLabel } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import type { UnitSystem } from '@/lib/units/dimension';
import { toDisplay } from '@/lib/units/format';
import { percent, sentence, unitText } from './numbers';

/** The picture of the speeds on one shared axis, in display units. Its table twin is the table of results. */
export interface SpeedFigure {
  unit: string;
  /** Ends of the axis and its ticks. */
  from: number;
  to: number;
  ticks: number[];
  lanes: Lane[];
  caption: string;
}

export interface Lane {
  label: string;
  vehicle: VehicleId;
  median: number;
  low: number;
  high: number;
  /** Outline of the density: position on the axis and height, 0..1 of the highest in this lane. */
  outline: [x: number, height: number][];
}

const SHOWN = ['A.approachSpeed', 'B.approachSpeed', 'A.deltaV', 'B.deltaV'] as const;
const STEPS = [0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50];
const MOST_TICKS = 12;

export function speedFigure(result: Result, shapes: Shapes, units: UnitSystem): SpeedFigure {
  const lanes = SHOWN.flatMap((name): Lane[] => {
    const band = result.bands[name];
    if (!band) return [];
    const shown = (si: number): number => toDisplay(si, 'speed', units);
    const vehicle = name.charAt(0) as VehicleId;
    return [
      {
        label: sentence(resultLabel(name)),
        vehicle,
        median: shown(band.median),
        low: shown(band.low),
        high: shown(band.high),
        outline: outlineOf(shapes[name], shown),
      },
    ];
  });
  const top = Math.max(1, ...lanes.flatMap((lane) => [lane.high, ...lane.outline.map(([x]) => x)]));
  const step = STEPS.find((s) => top / s <= MOST_TICKS) ?? 100;
  const to = Math.ceil(top / step) * step;
  const ticks = Array.from({ length: Math.round(to / step) + 1 }, (_, k) => k * step);
  return { unit: unitText('speed', units), from: 0, to, ticks, lanes, caption: captionOf(result.coverage) };
}

const captionOf = (coverage: number): string =>
  `Approach speeds and delta-V on one axis. Tick: median; bar: ${percent(coverage)} symmetric interval; outline: how the draws are distributed. The figures are in the table of results.`;

function outlineOf(shape: Shapes[keyof Shapes], shown: (si: number) => number): Lane['outline'] {
  if (!shape || shape.counts.length === 0) return [];
  const highest = Math.max(...shape.counts);
  const width = (shape.high - shape.low) / shape.counts.length;
  const middle = shape.counts.map((count, k): [number, number] => [
    Math.max(0, shown(shape.low + (k + 0.5) * width)),
    count / highest,
  ]);
  return [[Math.max(0, shown(shape.low)), 0], ...middle, [shown(shape.high), 0]];
}
