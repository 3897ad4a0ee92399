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
      <svg width="28" height="36" viewBox="-14 -18 28 36">
        <g transform={`rotate(${90 - (north * 180) / Math.PI})`}>
          <path d="M0 -15 L6 8 L0 4 L-6 8 Z" className={styles.northArrow} />
          <text y="17" className={styles.northLetter}>
            N
          </text>
        </g>
      </svg>
      <div className={styles.scaleBar} style={{ width: pixels }}>
        <span>{text}</span>
      </div>
    </div>
  );
}
