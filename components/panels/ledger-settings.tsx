'use client';
import { useSession } from '@/components/hooks/use-session';
import { EntryField } from '@/components/ui/entry-field';
import { DEFAULT_COVERAGE, DEFAULT_DRAWS, DEFAULT_SEED } from '@/lib/casefile/defaults';
import styles from './ledger.module.css';

const METHODS: [string, string][] = [
  ['directions', 'directions: both approach directions known, paths cross'],
  ['restitution', 'restitution: restitution and impulse ratio known'],
];

/** How the case is solved and shown. */
export function LedgerSettings() {
  const analysis = useSession((s) => s.casefile.analysis);
  const display = useSession((s) => s.casefile.display);
  const edit = useSession((s) => s.edit);
  const set = (path: string, to: unknown): string | null => edit(path, { do: 'set', path, to })[0]?.says ?? null;
  const shown = { units: display?.units ?? 'metric', paper: display?.paper ?? 'A4' };
  const number = (label: string, path: string, value: string, factor = 1) => (
    <div className={styles.pair}>
      <span>{label}</span>
      <EntryField
        label={label}
        text={value}
        unit={factor === 1 ? '' : '%'}
        onEnter={(typed) => {
          if (path === 'analysis.draws' && typed.trim() === 'auto') return set(path, 'auto');
          const figure = Number(typed.replaceAll(' ', ''));
          return Number.isFinite(figure) ? set(path, figure / factor) : `«${typed}» is not a number`;
        }}
      />
    </div>
  );
  return (
    <div className={styles.settings}>
      <label className={styles.pair}>
        <span>Method</span>
        <select
          aria-label="Method"
          value={analysis.method}
          onChange={(event) => set('analysis.method', event.target.value)}
        >
          {METHODS.map(([id, words]) => (
            <option key={id} value={id}>
              {words}
            </option>
          ))}
          {analysis.method === 'fit' && <option value="fit">fit: not solved by this version</option>}
        </select>
      </label>
      {analysis.contact === 'lasting' && (
        <p className={styles.note}>
          The contact that lasts is not solved by this version.{' '}
          <button type="button" className={styles.add} onClick={() => set('analysis.contact', 'instant')}>
            Use the instant contact
          </button>
        </p>
      )}
      {number('Draws', 'analysis.draws', String(analysis.draws ?? DEFAULT_DRAWS))}
      {number('Seed', 'analysis.seed', String(analysis.seed ?? DEFAULT_SEED))}
      {number(
        'Coverage',
        'analysis.coverage',
        String(Number((100 * (analysis.coverage ?? DEFAULT_COVERAGE)).toPrecision(6))),
        100,
      )}
      <label className={styles.pair}>
        <span>Units</span>
        <select
          aria-label="Units"
          value={shown.units}
          onChange={(event) => set('display', { ...shown, units: event.target.value })}
        >
          <option value="metric">metric: m, kg, km/h</option>
          <option value="us">US customary: ft, lb, mph</option>
        </select>
      </label>
      <label className={styles.pair}>
        <span>Paper</span>
        <select
          aria-label="Paper"
          value={shown.paper}
          onChange={(event) => set('display', { ...shown, paper: event.target.value })}
        >
          <option value="A4">A4</option>
          <option value="Letter">Letter</option>
        </select>
      </label>
    </div>
  );
}
