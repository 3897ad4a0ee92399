'use client';
import { TriangleAlert, X } from 'lucide-react';
import { memo } from 'react';
import { useSession, useSessionStore } from '@/components/hooks/use-session';
import { EntryField } from '@/components/ui/entry-field';
import { DEFAULT_SOURCE, startingQuantity } from '@/lib/casefile/defaults';
import { type Field, labelOf } from '@/lib/casefile/fields';
import { isQuantity, nodeAt } from '@/lib/casefile/quantities';
import type { CaseFile, Quantity } from '@/lib/casefile/schema';
import { enterQuantity, stepOf } from '@/lib/session/enter';
import type { Dimension, UnitSystem } from '@/lib/units/dimension';
import { entryText, limitsText } from '@/lib/units/entry';
import { fromDisplay, toDisplay, unitOf } from '@/lib/units/format';
import { parseEntry } from '@/lib/units/parse';
import { LedgerSpread } from './ledger-spread';
import styles from './ledger.module.css';

/** What a screen reader and a test call the field of a row: unique in the ledger. */
const fieldName = (casefile: CaseFile, field: Field): string => labelOf(casefile, field.path);

export interface RowProps {
  field: Field;
  units: UnitSystem;
  /** Share of the chosen result's spread that comes from here, 0..1; null where it is not traced. */
  share: number | null;
  /** Why a check or the method points here. */
  mark: string | null;
}

/** One value of the case: name, value with its spread, unit, source, and its share in the spread of the answer. */
export const LedgerRow = memo(Row, isSameRow);

/** Rows are listed anew at every edit; what a row shows of the case it reads for itself. */
function isSameRow(a: RowProps, b: RowProps): boolean {
  const { path, label, thing } = a.field;
  const same = path === b.field.path && label === b.field.label && thing === b.field.thing;
  return same && a.units === b.units && a.share === b.share && a.mark === b.mark;
}

function Row({ field, units, share, mark }: RowProps) {
  const node = useSession((s) => nodeAt(s.casefile, field.path) ?? null);
  const name = useSession((s) => fieldName(s.casefile, field));
  const selected = useSession((s) => s.selection === field.thing);
  const edit = useSession((s) => s.edit);
  const select = useSession((s) => s.select);
  const dimension = field.dimension ?? 'ratio';
  const quantity = isQuantity(node) ? node : null;
  return (
    <div className={styles.row} data-selected={selected} data-thing={field.thing} data-marked={mark !== null}>
      <div className={styles.name}>
        {mark && <TriangleAlert className={styles.mark} aria-label={mark} role="img" />}
        <span title={name}>{short(field)}</span>
      </div>
      {node === null ? (
        <button
          type="button"
          id={`field-${field.path}`}
          className={styles.add}
          aria-label={`Add ${name}`}
          onFocus={() => select(field.thing)}
          onClick={() => edit(`add ${name}`, { do: 'set', path: field.path, to: startingQuantity(field.path) })}
        >
          {field.path.endsWith('yawInertia') ? 'estimated; + state' : '+ add'}
        </button>
      ) : (
        <ValueField field={field} node={node} name={name} units={units} dimension={dimension} />
      )}
      <Share share={share} name={name} />
      {quantity && (
        <Below field={field} quantity={quantity} name={name} units={units} dimension={dimension} mark={mark} />
      )}
      {!quantity && mark && <p className={styles.marked}>{mark}</p>}
    </div>
  );
}

/** In its group the name need not say the vehicle again. */
const short = ({ label }: Field): string => {
  const plain = label.replace(/^[AB]: /, (prefix) => prefix);
  return plain.charAt(0).toUpperCase() + plain.slice(1);
};

function ValueField({
  field,
  node,
  name,
  units,
  dimension,
}: {
  field: Field;
  node: unknown;
  name: string;
  units: UnitSystem;
  dimension: Dimension;
}) {
  const session = useSessionStore();
  const { path, kind, thing } = field;
  const text =
    kind === 'text'
      ? String(node)
      : isQuantity(node)
        ? entryText(node.value, node.spread, dimension, units)
        : entryText(Number(node), undefined, dimension, units);

  function onEnter(typed: string): string | null {
    const { edit } = session.getState();
    if (kind === 'text') return edit(name, { do: 'set', path, to: typed })[0]?.says ?? null;
    const entry = parseEntry(typed, dimension, units);
    if (!entry.ok) return entry.says;
    if (isQuantity(node)) return edit(name, enterQuantity(path, node, entry))[0]?.says ?? null;
    return edit(name, { do: 'set', path, to: entry.value })[0]?.says ?? null;
  }

  function onStep(steps: number): void {
    const si = isQuantity(node) ? node.value : Number(node);
    const shown = toDisplay(si, dimension, units);
    const to = fromDisplay(Number((shown + steps * stepOf(shown)).toPrecision(10)), dimension, units);
    const { edit } = session.getState();
    edit(name, isQuantity(node) ? enterQuantity(path, node, { value: to }) : { do: 'set', path, to });
  }

  return (
    <EntryField
      id={`field-${path}`}
      label={name}
      text={text}
      unit={kind === 'text' ? undefined : unitOf(dimension, units).symbol}
      onEnter={onEnter}
      onStep={kind === 'text' ? undefined : onStep}
      onFocus={() => session.getState().select(thing)}
      wide={kind === 'text'}
    />
  );
}

/** A bar for the eye and a figure for the ear. */
function Share({ share, name }: { share: number | null; name: string }) {
  if (share === null) return <span />;
  const percent = Math.round(100 * Math.max(0, share));
  return (
    <span
      className={styles.share}
      role="img"
      aria-label={`${name} carries ${percent} % of the spread`}
      title={`${percent} % of the spread`}
    >
      <i style={{ width: `${Math.min(100, percent)}%` }} />
    </span>
  );
}

/** Under the value: where it comes from, what the line could not say, and the spread to set. */
function Below({
  field,
  quantity,
  name,
  units,
  dimension,
  mark,
}: {
  field: Field;
  quantity: Quantity;
  name: string;
  units: UnitSystem;
  dimension: Dimension;
  mark: string | null;
}) {
  const edit = useSession((s) => s.edit);
  const limits = limitsText(quantity.value, quantity.spread, dimension, units);
  const isDefault = quantity.source === DEFAULT_SOURCE;
  return (
    <div className={styles.below}>
      {mark && <p className={styles.marked}>{mark}</p>}
      <details>
        <summary aria-label={`Spread and source of ${name}`}>
          {limits && <span>{limits}</span>}
          <span className={isDefault ? styles.untouched : undefined}>{quantity.source || 'no source yet'}</span>
        </summary>
        <LedgerSpread path={field.path} quantity={quantity} name={name} dimension={dimension} units={units} />
      </details>
      {field.optional && (
        <button
          type="button"
          className={styles.clear}
          aria-label={`Take away ${name}`}
          title="Take this value away"
          onClick={() => edit(`take away ${name}`, { do: 'set', path: field.path, to: null })}
        >
          <X aria-hidden />
        </button>
      )}
    </div>
  );
}
