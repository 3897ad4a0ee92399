'use client';
import { useSession } from '@/components/hooks/use-session';
import { EntryField } from '@/components/ui/entry-field';
import { DEFAULT_COVERAGE, DEFAULT_DRAWS, DEFAULT_PARTICLES, DEFAULT_SEED } from '@/lib/casefile/defaults';
import styles from './ledger.module.css';

const METHODS: [id: string, name: string, when: string][] = [
  ['directions', 'two known directions', 'Both directions of approach are known and their paths cross.'],
  ['restitution', 'known restitution', 'Restitution, impulse ratio and both yaw rates after contact are known.'],
  [
    'fit',
    'all evidence together',
    'Everything that is known is weighed together, however little; what is not stated is left open.',
  ],
];

const CONTACTS: [id: string, name: string, when: string][] = [
  ['instant', 'an instant', 'The vehicles do not move while they touch, and the tyres give nothing meanwhile.'],
  [
    'lasting',
    'lasting',
    'The tyres push while the vehicles touch: at walking pace they give a good part of the impulse. Needs the contact duration; poses are those at first touch.',
  ],
];

/** How the case is solved and shown. */
export function LedgerSettings() {
  const analysis = useSession((s) => s.casefile.analysis);
  const display = useSession((s) => s.casefile.display);
  const edit = useSession((s) => s.edit);
  const set = (label: string, path: string, to: unknown): string | null =>
    edit(label, { do: 'set', path, to })[0]?.says ?? null;
  const shown = { units: display?.units ?? 'metric', paper: display?.paper ?? 'A4' };
  const coverage = String(Number((100 * (analysis.coverage ?? DEFAULT_COVERAGE)).toPrecision(6)));
  return (
    <div className={styles.settings}>
      <Choice
        label="Method"
        value={analysis.method}
        options={METHODS.map(([id, name]) => [id, name] as const)}
        onChoose={(method) => set('method', 'analysis.method', method)}
      />
      <p className={styles.hint}>{METHODS.find(([id]) => id === analysis.method)?.[2]}</p>
      {analysis.method !== 'restitution' && (
        <>
          <Choice
            label="Contact"
            value={analysis.contact ?? 'instant'}
            options={CONTACTS.map(([id, name]) => [id, name] as const)}
            onChoose={(contact) => set('kind of contact', 'analysis.contact', contact)}
          />
          <p className={styles.hint}>{CONTACTS.find(([id]) => id === (analysis.contact ?? 'instant'))?.[2]}</p>
        </>
      )}
      <Figure
        label="Draws"
        text={String(analysis.draws ?? (analysis.method === 'fit' ? DEFAULT_PARTICLES : DEFAULT_DRAWS))}
        onEnter={(typed) =>
          typed.trim() === 'auto'
            ? set('draws', 'analysis.draws', 'auto')
            : withFigure(typed, (figure) => set('draws', 'analysis.draws', figure))
        }
      />
      <Figure
        label="Seed"
        text={String(analysis.seed ?? DEFAULT_SEED)}
        onEnter={(typed) => withFigure(typed, (figure) => set('seed', 'analysis.seed', figure))}
      />
      <Figure
        label="Coverage"
        text={coverage}
        unit="%"
        onEnter={(typed) => withFigure(typed, (figure) => set('coverage', 'analysis.coverage', figure / 100))}
      />
      <Choice
        label="Units"
        value={shown.units}
        options={[
          ['metric', 'metric: m, kg, km/h'],
          ['us', 'US customary: ft, lb, mph'],
        ]}
        onChoose={(units) => set('units', 'display', { ...shown, units })}
      />
      <Choice
        label="Paper"
        value={shown.paper}
        options={[
          ['A4', 'A4'],
          ['Letter', 'Letter'],
        ]}
        onChoose={(paper) => set('paper', 'display', { ...shown, paper })}
      />
    </div>
  );
}

/** Hands on a plain number, or says that it is none. */
function withFigure(typed: string, take: (figure: number) => string | null): string | null {
  const plain = typed.replaceAll(/[\s%]/g, '').replace(',', '.');
  const figure = Number(plain);
  return plain !== '' && Number.isFinite(figure) ? take(figure) : `«${typed}» is not a number`;
}

function Choice({
  label,
  value,
  options,
  onChoose,
}: {
  label: string;
  value: string;
  options: readonly (readonly [id: string, words: string])[];
  onChoose: (id: string) => void;
}) {
  return (
    <label className={styles.pair}>
      <span>{label}</span>
      <select aria-label={label} value={value} onChange={(event) => onChoose(event.target.value)}>
        {options.map(([id, words]) => (
          <option key={id} value={id}>
            {words}
          </option>
        ))}
      </select>
    </label>
  );
}

function Figure({
  label,
  text,
  unit = '',
  onEnter,
}: {
  label: string;
  text: string;
  unit?: string;
  onEnter: (typed: string) => string | null;
}) {
  return (
    <div className={styles.pair}>
      <span>{label}</span>
      <EntryField label={label} text={text} unit={unit} onEnter={onEnter} />
    </div>
  );
}
