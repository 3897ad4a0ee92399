'use client';
import { X } from 'lucide-react';
import { memo, useId } from 'react';
import { useSession, useSessionStore } from '@/components/hooks/use-session';
import { EntryField } from '@/components/ui/entry-field';
import { DEFAULT_SOURCE, startingQuantity } from '@/lib/casefile/defaults';
import { type Field, labelOf } from '@/lib/casefile/fields';
import { isQuantity, nodeAt } from '@/lib/casefile/quantities';
import type { CaseFile, Quantity } from '@/lib/casefile/schema';
import { enterQuantity, stepOf } from '@/lib/session/enter';
import type { Dimension, UnitSystem } from '@/lib/units/dimension';
import { entryText, limitsText, widthOf } from '@/lib/units/entry';
import { fromDisplay, toDisplay, unitOf } from '@/lib/units/format';
import { parseEntry } from '@/lib/units/parse';
import { focusNext } from './focus-next';
import { LedgerMark } from './ledger-mark';
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
  const markId = useId();
  return (
    <div className={styles.row} data-selected={selected} data-thing={field.thing} onFocus={() => select(field.thing)}>
      <div className={styles.name}>
        <span title={name}>{field.label}</span>
      </div>
      {node === null ? (
        <button
          type="button"
          id={`field-${field.path}`}
          className={styles.add}
          aria-label={`Add ${name}`}
          aria-describedby={mark === null ? undefined : markId}
          onClick={() => {
            edit(`add ${name}`, { do: 'set', path: field.path, to: startingQuantity(field.path) });
            focusNext(`field-${field.path}`);
          }}
        >
          + add
        </button>
      ) : (
        <ValueField
          field={field}
          node={node}
          name={name}
          units={units}
          dimension={dimension}
          describedBy={mark === null ? undefined : markId}
        />
      )}
      <Share share={share} name={name} />
      {node === null && field.path.endsWith('yawInertia') && (
        <p className={styles.instead}>estimated from mass and axles</p>
      )}
      {mark && <LedgerMark id={markId} says={mark} />}
      {quantity && <Below field={field} quantity={quantity} name={name} units={units} dimension={dimension} />}
    </div>
  );
}

function ValueField({
  field,
  node,
  name,
  units,
  dimension,
  describedBy,
}: {
  field: Field;
  node: unknown;
  name: string;
  units: UnitSystem;
  dimension: Dimension;
  describedBy: string | undefined;
}) {
  const session = useSessionStore();
  const { path, kind } = field;
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
    const width = isQuantity(node) ? toDisplay(widthOf(node.spread), dimension, units) : 0;
    const to = fromDisplay(Number((shown + steps * stepOf(shown, width)).toPrecision(10)), dimension, units);
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
      wide={kind === 'text'}
      describedBy={describedBy}
    />
  );
}

/** Shares below this are noise of the draws: nothing is drawn for them. */
const LEAST_SHARE = 0.005;

/** A bar and a figure for the eye, a sentence for the ear. */
function Share({ share, name }: { share: number | null; name: string }) {
  if (share === null) return <span />;
  const percent = Math.round(100 * Math.min(1, Math.max(0, share)));
  const words = `${name} carries ${share < LEAST_SHARE ? 'less than 1' : percent} % of the spread`;
  return (
    <span className={styles.share} role="img" aria-label={words} title={words}>
      <span className={styles.track}>
        <span style={{ width: `${percent}%` }} />
      </span>
      {share >= LEAST_SHARE && <span className={styles.percent}>{percent}&nbsp;%</span>}
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
}: {
  field: Field;
  quantity: Quantity;
  name: string;
  units: UnitSystem;
  dimension: Dimension;
}) {
  const edit = useSession((s) => s.edit);
  const limits = limitsText(quantity.value, quantity.spread, dimension, units);
  const isDefault = quantity.source === DEFAULT_SOURCE;
  return (
    <div className={styles.below}>
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
          onClick={() => {
            edit(`take away ${name}`, { do: 'set', path: field.path, to: null });
            focusNext(`field-${field.path}`);
          }}
        >
          <X aria-hidden />
        </button>
      )}
    </div>
  );
}
