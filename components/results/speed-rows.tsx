import type { CaseFile } from '@/lib/casefile/schema';
import { percent, unitText } from '@/lib/report/numbers';
import type { ResultName } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import { type SpeedRow, speedRows } from '@/lib/results/series';
import type { Shapes } from '@/lib/solve-case';
import type { UnitSystem } from '@/lib/units/dimension';
import { said, unitsShown, vehicleOf } from './result-words';
import { SpeedBands } from './speed-bands';
import styles from './speed-rows.module.css';

const NAMES: Partial<Record<ResultName, string>> = {
  'A.approachSpeed': 'Approach speed A',
  'B.approachSpeed': 'Approach speed B',
  'A.deltaV': 'Delta-V A',
  'B.deltaV': 'Delta-V B',
  closingSpeed: 'Closing speed',
};

/** The speeds in figures, and beside them how they are distributed on one axis. */
export function SpeedRows({ result, shapes, of }: { result: Result; shapes: Shapes; of: CaseFile }) {
  const units = unitsShown(of);
  const rows = speedRows(result, shapes);
  return (
    <div className={styles.speeds}>
      <table className={styles.figures}>
        <caption className="visually-hidden">Speeds: median and {percent(result.coverage)} interval</caption>
        <tbody>
          {rows.map((row) => (
            <Figures key={row.name} row={row} result={result} units={units} />
          ))}
        </tbody>
      </table>
      <SpeedBands
        rows={rows}
        units={units}
        label={`Densities of the speeds on one axis in ${unitText('speed', units)}; the figures are in the table beside it.`}
      />
      <p className={styles.key}>
        {unitText('speed', units)} · tick median · bar {percent(result.coverage)} interval · outline draws
      </p>
    </div>
  );
}

function Figures({ row, result, units }: { row: SpeedRow; result: Result; units: UnitSystem }) {
  const found = said(result, row.name, units);
  if (!found) return null;
  return (
    <tr>
      <th scope="row">
        <i className={styles.swatch} data-vehicle={vehicleOf(row.name) ?? 'pair'} aria-hidden />
        {NAMES[row.name]}
      </th>
      <td>
        <span className={styles.median}>
          {found.bound && <small>{found.bound} </small>}
          {found.figure} <small>{found.unit}</small>
        </span>
        <span className={styles.interval}>{found.interval}</span>
      </td>
    </tr>
  );
}
