import type { CaseFile, VehicleId } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import { percent } from '@/lib/report/numbers';
import { pushWords } from '@/lib/results/direction-words';
import type { ResultName } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import { said, unitsShown } from './result-words';
import styles from './pair-figures.module.css';

const ROWS: [ResultName, string][] = [
  ['restitution', 'Restitution'],
  ['impulseRatio', 'Impulse ratio'],
  ['energyLost', 'Energy lost'],
  ['slidingSpeed', 'Sliding speed'],
  ['A.meanAcceleration', 'Mean acceleration A'],
  ['B.meanAcceleration', 'Mean acceleration B'],
];

/** An interval of directions wider than this says nothing, deg. */
const ANY_DIRECTION = 300;

/** What the contact was like, and from where each vehicle was pushed. */
export function PairFigures({ result, of }: { result: Result; of: CaseFile }) {
  const units = unitsShown(of);
  const share = result.more.shareLost;
  return (
    <div className={styles.block}>
      <table className={styles.table}>
        <caption className="visually-hidden">The contact: median and {percent(result.coverage)} interval</caption>
        <tbody>
          {ROWS.map(([name, label]) => {
            const found = said(result, name, units);
            return (
              found && (
                <tr key={name}>
                  <th scope="row">{label}</th>
                  <td className={styles.figure}>
                    {found.bound} {found.figure} {found.unit}
                  </td>
                  <td className={styles.interval}>{found.interval}</td>
                </tr>
              )
            );
          })}
        </tbody>
      </table>
      <dl className={styles.words}>
        {share !== undefined && (
          <div>
            <dt>Share of the closing energy lost</dt>
            <dd>{shareWords(share)}</dd>
          </div>
        )}
        {VEHICLE_IDS.map((id) => (
          <Push key={id} id={id} result={result} />
        ))}
      </dl>
    </div>
  );
}

/** More than all of it cannot be lost: then what is stated does not belong to one contact. */
const shareWords = (share: number): string => {
  const figure = percent(Math.round(share * 100) / 100);
  return share > 1 ? `${figure}, more than there was: yaw rates, plane and contact point do not agree` : figure;
};

/** The side that the push came from: opposite to the direction of delta-V, which the table of all results states. */
function Push({ id, result }: { id: VehicleId; result: Result }) {
  const band = result.bands[`${id}.deltaVDirection`];
  if (!band) return null;
  const half = (band.high - band.low) / 2;
  return (
    <div title={`Opposite to the delta-V of ${id}. The direction of delta-V itself stands in the table.`}>
      <dt>Push on {id}</dt>
      <dd>
        {band.high - band.low > ANY_DIRECTION
          ? 'from no certain direction'
          : `${pushWords(band.median)}${half < 0.5 ? '' : ` (±${Math.round(half)}°)`}`}
      </dd>
    </div>
  );
}
