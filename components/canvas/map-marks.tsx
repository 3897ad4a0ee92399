import { toDegrees } from '@/lib/geometry/vector';
import { METRES_PER, scaleBar } from '@/lib/scene/grid';
import type { View } from '@/lib/scene/view';
import type { UnitSystem } from '@/lib/units/dimension';
import styles from './board.module.css';

const LONGEST = 160;

/** Scale bar and north. `north`: its direction in the world, rad. */
export function MapMarks({ view, units, north }: { view: View; units: UnitSystem; north: number }) {
  const { units: count, pixels } = scaleBar(view, METRES_PER[units], LONGEST);
  const text = `${Number(count.toPrecision(3))} ${units === 'metric' ? 'm' : 'ft'}`;
  return (
    <div className={styles.marks} aria-hidden>
      <svg width="40" height="40" viewBox="-20 -20 40 40">
        <path
          d="M0 -12 L6 10 L0 6 L-6 10 Z"
          className={styles.northArrow}
          transform={`rotate(${90 - toDegrees(north)})`}
        />
        <text x={16 * Math.cos(north)} y={4 - 16 * Math.sin(north)} className={styles.northLetter}>
          N
        </text>
      </svg>
      <div className={styles.scaleBar} style={{ width: pixels }}>
        <span>{text}</span>
      </div>
    </div>
  );
}
