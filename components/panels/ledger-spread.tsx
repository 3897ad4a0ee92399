'use client';
import { useSession } from '@/components/hooks/use-session';
import { EntryField } from '@/components/ui/entry-field';
import { supportOf } from '@/lib/casefile/quantities';
import type { Quantity, Spread } from '@/lib/casefile/schema';
import type { Dimension, UnitSystem } from '@/lib/units/dimension';
import { figureText } from '@/lib/units/entry';
import { unitOf } from '@/lib/units/format';
import { parseEntry } from '@/lib/units/parse';
import styles from './ledger.module.css';

const SHAPES: [Spread['shape'], string][] = [
  ['fixed', 'fixed'],
  ['normal', 'normal: standard uncertainty'],
  ['rectangular', 'rectangular: between limits'],
  ['triangular', 'triangular: limits, peak at the value'],
];

/** A spread of another shape with about the same size; the first guess is a twentieth of the value. */
function reshaped(path: string, shape: Spread['shape'], { value, spread }: Quantity): Spread {
  const half =
    spread?.shape === 'normal'
      ? 2 * spread.sd
      : spread && spread.shape !== 'fixed'
        ? (spread.high - spread.low) / 2
        : Math.max(Math.abs(value) / 20, 0.01);
  if (shape === 'fixed') return { shape };
  if (shape === 'normal') return { shape, sd: half / 2 };
  const { low: least, high: most, lowOpen } = supportOf(path);
  const low = lowOpen && value - half <= least ? value / 2 : Math.max(least, value - half);
  const [from, to] = [low, Math.min(most, value + half)].map((x) => Number(x.toPrecision(6)));
  return { shape, low: from, high: to };
}

/** Shape and size of a spread, and where the value comes from. */
export function LedgerSpread({
  path,
  quantity,
  name,
  dimension,
  units,
}: {
  path: string;
  quantity: Quantity;
  name: string;
  dimension: Dimension;
  units: UnitSystem;
}) {
  const edit = useSession((s) => s.edit);
  const spread: Spread = quantity.spread ?? { shape: 'fixed' };
  const set = (to: Quantity): string | null => edit(`spread of ${name}`, { do: 'set', path, to })[0]?.says ?? null;
  const { symbol } = unitOf(dimension, units);

  const figure = (key: 'sd' | 'low' | 'high', label: string, value: number) => (
    <div key={key} className={styles.pair}>
      <span>{label}</span>
      <EntryField
        label={`${label} of ${name}`}
        text={figureText(value, dimension, units)}
        unit={symbol}
        onEnter={(typed) => {
          const entry = parseEntry(typed, dimension, units);
          if (!entry.ok) return entry.says;
          return set({ ...quantity, spread: { ...spread, [key]: entry.value } });
        }}
      />
    </div>
  );

  return (
    <div className={styles.spread}>
      <label className={styles.pair}>
        <span>Shape</span>
        <select
          aria-label={`Shape of the spread of ${name}`}
          value={spread.shape}
          onChange={(event) =>
            set({ ...quantity, spread: reshaped(path, event.target.value as Spread['shape'], quantity) })
          }
        >
          {SHAPES.map(([shape, words]) => (
            <option key={shape} value={shape}>
              {words}
            </option>
          ))}
        </select>
      </label>
      {spread.shape === 'normal' && figure('sd', 'Standard uncertainty', spread.sd)}
      {(spread.shape === 'rectangular' || spread.shape === 'triangular') && (
        <>
          {figure('low', 'Lower limit', spread.low)}
          {figure('high', 'Upper limit', spread.high)}
        </>
      )}
      <div className={styles.pair}>
        <span>Source</span>
        <EntryField
          label={`Source of ${name}`}
          text={quantity.source ?? ''}
          wide
          onEnter={(source) => set({ ...quantity, source })}
        />
      </div>
    </div>
  );
}
