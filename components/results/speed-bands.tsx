'use client';
import { scaleLinear } from 'd3-scale';
import { area, curveMonotoneX } from 'd3-shape';
import { useId } from 'react';
import { useSize } from '@/components/hooks/use-size';
import { type DensityPoint, type SpeedRow, axisOf } from '@/lib/results/series';
import type { UnitSystem } from '@/lib/units/dimension';
import { toDisplay } from '@/lib/units/format';
import { vehicleOf } from './result-words';
import styles from './speed-bands.module.css';

/** Room for the axis under the rows, px. */
export const AXIS = 20;
const MARGIN = 10;
/** Between two ticks, px. */
const TICK = 36;

interface Placed {
  x: (si: number) => number;
  height: number;
}

/** The densities of the speeds on one axis, one under another, each to its own height. */
export function SpeedBands({ rows, units, label }: { rows: readonly SpeedRow[]; units: UnitSystem; label: string }) {
  const [ref, size] = useSize<HTMLDivElement>();
  const hatch = useId();
  const [width, height] = [size?.width ?? 0, size?.height ?? 0];
  const shown = (si: number): number => toDisplay(si, 'speed', units);
  const [from, to] = axisOf(rows);
  const scale = scaleLinear([shown(from), Math.max(shown(to), 1)], [MARGIN, Math.max(width - MARGIN, MARGIN + 1)]).nice(
    6,
  );
  const rowHeight = Math.max(0, height - AXIS) / Math.max(rows.length, 1);
  const placed: Placed = { x: (si) => scale(shown(si)), height: rowHeight };
  return (
    <div ref={ref} className={styles.plot}>
      {width > 0 && (
        <svg width={width} height={height} role="img" aria-label={label}>
          <Hatch id={hatch} />
          <g aria-hidden>
            {scale.ticks(Math.max(2, Math.floor(width / TICK))).map((tick) => (
              <g key={tick} transform={`translate(${scale(tick)} 0)`}>
                <line y2={height - AXIS} className={tick === 0 ? styles.zero : styles.grid} />
                <text y={height - 5} className={styles.tick}>
                  {scale.tickFormat(6)(tick)}
                </text>
              </g>
            ))}
            {rows.map((row, k) => (
              <g key={row.name} transform={`translate(0 ${k * rowHeight})`}>
                <Lane row={row} placed={placed} hatch={hatch} />
              </g>
            ))}
          </g>
        </svg>
      )}
    </div>
  );
}

/** What tells B from A where colours do not. */
function Hatch({ id }: { id: string }) {
  return (
    <defs>
      <pattern id={id} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <rect width="5" height="5" className={styles.ground} />
        <line y2="5" className={styles.hatch} />
      </pattern>
    </defs>
  );
}

function Lane({
  row: { name, band, density },
  placed: { x, height },
  hatch,
}: {
  row: SpeedRow;
  placed: Placed;
  hatch: string;
}) {
  const base = height - 7;
  const vehicle = vehicleOf(name) ?? 'pair';
  const fill = vehicle === 'B' ? `url(#${hatch})` : undefined;
  return (
    <g data-vehicle={vehicle} className={styles.lane}>
      {density.length > 0 && <path d={outline(density, x, base)} className={styles.density} style={{ fill }} />}
      <line x1={x(band.low)} x2={x(band.high)} y1={base + 2} y2={base + 2} className={styles.interval} />
      {[band.low, band.high].map((end) => (
        <line key={end} x1={x(end)} x2={x(end)} y1={base - 1} y2={base + 5} className={styles.end} />
      ))}
      <line x1={x(band.median)} x2={x(band.median)} y1={4} y2={base + 5} className={styles.median} />
    </g>
  );
}

/** The shape under a density, its highest point just below the top of the row. */
function outline(density: readonly DensityPoint[], x: Placed['x'], base: number): string {
  const highest = Math.max(...density.map(({ y }) => y));
  const path = area<DensityPoint>()
    .x((point) => x(point.x))
    .y0(base)
    .y1((point) => base - (point.y / highest) * (base - 6))
    .curve(curveMonotoneX);
  return path([...density]) ?? '';
}
