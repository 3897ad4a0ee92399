import { useState } from 'react';
import buttons from '@/components/ui/button.module.css';
import type { CaseFile } from '@/lib/casefile/schema';
import { percent, printedBand, sentence, unitText } from '@/lib/report/numbers';
import { RESULT_NAMES, resultDimension, resultLabel } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import type { UnitSystem } from '@/lib/units/dimension';
import { decimalsFor, formatValue } from '@/lib/units/format';
import { unitsShown } from './result-words';
import styles from './results-table.module.css';

const columnsOf = ({ coverage }: Result): string[] => [
  'Result',
  'Unit',
  'Median',
  'Mean',
  'Standard deviation',
  `${percent(coverage)} from`,
  'to',
  'Shortest from',
  'to',
];

/** Every result in figures, in the order of the contract: [label, unit, seven figures]. */
function rowsOf(result: Result, units: UnitSystem): string[][] {
  return RESULT_NAMES.flatMap((name) => {
    const band = result.bands[name];
    if (!band) return [];
    const dimension = resultDimension(name);
    const { median, u, low, high, shortest } = printedBand(band, undefined, dimension, units);
    const decimals = decimalsFor(Math.min(band.sd, (band.high - band.low) / 2), dimension, units, { headline: true });
    const mean = formatValue(band.mean, dimension, units, { decimals });
    return [[sentence(resultLabel(name)), unitText(dimension, units), median, mean, u, low, high, ...shortest]];
  });
}

/** The twin in figures of all that the answer shows as pictures. */
export function ResultsTable({ result, of }: { result: Result; of: CaseFile }) {
  const columns = columnsOf(result);
  const rows = rowsOf(result, unitsShown(of));
  return (
    <div className={styles.whole}>
      <div className={styles.bar}>
        <CopyButton text={[columns, ...rows].map((cells) => cells.join('\t')).join('\n')} />
        <p>
          Directions count counter-clockwise: in the plan from the x axis, of delta-V from the front of the vehicle.
          Delta-V points the way the velocity changed; the push came from the opposite side.
        </p>
      </div>
      <table className={styles.table}>
        <caption className="visually-hidden">All results over {result.draws.toLocaleString('en')} draws</caption>
        <thead>
          <tr>
            {columns.map((title, k) => (
              <th key={k} scope="col">
                {title}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(([label, ...cells]) => (
            <tr key={label}>
              <th scope="row">{label}</th>
              {cells.map((cell, k) => (
                <td key={k}>{cell}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** Columns parted by tabs, as a spreadsheet takes them. */
function CopyButton({ text }: { text: string }) {
  const [says, setSays] = useState('Copy as text');
  const copy = async (): Promise<void> => {
    try {
      await navigator.clipboard.writeText(text);
      setSays('Copied');
    } catch {
      setSays('The browser did not allow it: select the table instead');
    }
  };
  return (
    <button type="button" className={buttons.button} onClick={() => void copy()} onBlur={() => setSays('Copy as text')}>
      {says}
    </button>
  );
}
