import type { Lane, SpeedFigure } from '@/lib/report/speed-figure';
import styles from './speed-chart.module.css';

/* The drawing's own millimetres. */
const WIDTH = 178;
const LABELS = 46;
const LANE = 11.5;
const TOP = 2;
const BAR = 2.2;

/** Approach speeds and delta-V on one axis; A is filled plain, B is hatched. */
export function SpeedChart({ figure }: { figure: SpeedFigure }) {
  const { from, to, ticks, lanes, unit, caption } = figure;
  const bottom = TOP + lanes.length * LANE;
  const x = (speed: number): number => LABELS + ((speed - from) / (to - from)) * (WIDTH - LABELS - 4);
  return (
    <figure className={styles.figure}>
      <svg viewBox={`0 0 ${WIDTH} ${bottom + 10}`} role="img" aria-label={caption}>
        <defs>
          <pattern id="hatch-b" width="1.4" height="1.4" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
            <rect width="1.4" height="1.4" className={styles.paper} />
            <line x1="0" y1="0" x2="0" y2="1.4" className={styles.hatch} />
          </pattern>
        </defs>
        {ticks.map((tick) => (
          <g key={tick}>
            <line x1={x(tick)} x2={x(tick)} y1={TOP} y2={bottom} className={styles.grid} />
            <text x={x(tick)} y={bottom + 4} className={styles.tick}>
              {Number(tick.toFixed(1))}
            </text>
          </g>
        ))}
        <line x1={x(from)} x2={x(to)} y1={bottom} y2={bottom} className={styles.axis} />
        <text x={(x(from) + x(to)) / 2} y={bottom + 8.6} className={styles.tick}>
          speed, {unit}
        </text>
        {lanes.map((lane, k) => (
          <LaneView key={lane.label} lane={lane} x={x} base={TOP + (k + 1) * LANE - 3.4} />
        ))}
      </svg>
      <figcaption>{caption}</figcaption>
    </figure>
  );
}

const HEIGHT = LANE - 4.6;

function LaneView({ lane, x, base }: { lane: Lane; x: (speed: number) => number; base: number }) {
  const outline = lane.outline.map(
    ([speed, height]) => `${x(speed).toFixed(2)},${(base - height * HEIGHT).toFixed(2)}`,
  );
  const [low, high, median] = [x(lane.low), x(lane.high), x(lane.median)];
  return (
    <g>
      <text x={LABELS - 4} y={base - 1} className={styles.label}>
        {lane.label}
      </text>
      {outline.length > 0 && (
        <polygon points={outline.join(' ')} className={styles.density} data-vehicle={lane.vehicle} />
      )}
      <line x1={low} x2={high} y1={base + 1.4} y2={base + 1.4} className={styles.bar} />
      <line x1={low} x2={low} y1={base + 1.4 - BAR / 2} y2={base + 1.4 + BAR / 2} className={styles.end} />
      <line x1={high} x2={high} y1={base + 1.4 - BAR / 2} y2={base + 1.4 + BAR / 2} className={styles.end} />
      <line x1={median} x2={median} y1={base - 2.5} y2={base + 1.4 + BAR / 2} className={styles.median} />
    </g>
  );
}
