'use client';
import { Plus, Trash2, X } from 'lucide-react';
import { useSession, useSessionStore } from '@/components/hooks/use-session';
import buttons from '@/components/ui/button.module.css';
import { EntryField } from '@/components/ui/entry-field';
import { FEWEST_CORNERS, cornerAddition, cornerRemoval, patchAddition } from '@/lib/session/surface-edits';
import type { NamedEdit } from '@/lib/session/named-edit';
import { deletion } from '@/lib/session/thing-edits';
import type { UnitSystem } from '@/lib/units/dimension';
import { figureText } from '@/lib/units/entry';
import { unitOf } from '@/lib/units/format';
import { parseEntry } from '@/lib/units/parse';
import { focusNext } from './focus-next';
import styles from './ledger.module.css';

/** Under the rows of a surface: its corners as numbers, and what takes it away. */
export function LedgerCorners({ index, units }: { index: number; units: UnitSystem }) {
  const outline = useSession((s) => s.casefile.scene?.surfaces?.[index]?.outline) ?? [];
  const session = useSessionStore();
  const carryOut = (found: NamedEdit | null, next: string): void => {
    if (!found) return;
    session.getState().edit(found.label, found.edit);
    focusNext(next);
  };
  const whole = `surface ${index + 1}`;
  const at = `field-scene.surfaces.${index}.outline`;
  return (
    <div className={styles.corners} onFocus={() => session.getState().select(`surface.${index}`)}>
      <details>
        <summary id={at} aria-label={`Corners of ${whole}`}>
          {outline.length} corners
        </summary>
        {outline.map((corner, k) => (
          <CornerRow
            key={k}
            index={index}
            corner={k}
            at={corner}
            few={outline.length <= FEWEST_CORNERS}
            units={units}
            carryOut={carryOut}
          />
        ))}
      </details>
      <button
        type="button"
        className={styles.clear}
        aria-label={`Take away ${whole}`}
        title={`Take away ${whole}`}
        onClick={() => {
          carryOut(deletion(session.getState().casefile, `surface.${index}`), 'field-scene.surfaces');
          session.getState().select(null);
        }}
      >
        <Trash2 aria-hidden />
      </button>
    </div>
  );
}

interface RowProps {
  index: number;
  corner: number;
  at: readonly [number, number];
  /** Whether none can be spared. */
  few: boolean;
  units: UnitSystem;
  /** Carries an edit out and takes the focus on. */
  carryOut: (found: NamedEdit | null, next: string) => void;
}

/** One corner: its place, a further one after it, and away with it. */
function CornerRow({ index, corner, at, few, units, carryOut }: RowProps) {
  const session = useSessionStore();
  const whole = `surface ${index + 1}`;
  const field = `field-scene.surfaces.${index}.outline`;
  const add = (): void =>
    carryOut(cornerAddition(session.getState().casefile, index, corner), `${field}.${corner + 1}.0`);
  const remove = (): void => carryOut(cornerRemoval(session.getState().casefile, index, corner), field);
  return (
    <div className={styles.corner}>
      <span>{corner + 1}</span>
      <CornerField index={index} corner={corner} axis={0} value={at[0]} units={units} />
      <CornerField index={index} corner={corner} axis={1} value={at[1]} units={units} />
      <button
        type="button"
        className={styles.clear}
        aria-label={`Add a corner after corner ${corner + 1} of ${whole}`}
        title="Add a corner after this one"
        onClick={add}
      >
        <Plus aria-hidden />
      </button>
      <button
        type="button"
        className={styles.clear}
        aria-label={`Take away corner ${corner + 1} of ${whole}`}
        title="Take this corner away"
        disabled={few}
        onClick={remove}
      >
        <X aria-hidden />
      </button>
    </div>
  );
}

interface CornerProps {
  index: number;
  corner: number;
  axis: 0 | 1;
  value: number;
  units: UnitSystem;
}

function CornerField({ index, corner, axis, value, units }: CornerProps) {
  const edit = useSession((s) => s.edit);
  const path = `scene.surfaces.${index}.outline.${corner}.${axis}`;
  return (
    <EntryField
      id={`field-${path}`}
      label={`Surface ${index + 1}: corner ${corner + 1}, ${axis === 0 ? 'x' : 'y'}`}
      text={figureText(value, 'length', units)}
      unit={unitOf('length', units).symbol}
      onEnter={(typed) => {
        const entry = parseEntry(typed, 'length', units);
        if (!entry.ok) return entry.says;
        return edit(`shape surface ${index + 1}`, { do: 'set', path, to: entry.value })[0]?.says ?? null;
      }}
    />
  );
}

/** What surfaces are for, and a first one for those who do not draw. */
export function LedgerSurfaces() {
  const count = useSession((s) => s.casefile.scene?.surfaces?.length ?? 0);
  const session = useSessionStore();
  const add = (): void => {
    const { casefile, edit, select } = session.getState();
    const { label, edit: addition } = patchAddition(casefile);
    edit(label, addition);
    select(`surface.${count}`);
    focusNext(`field-scene.surfaces.${count}.name`);
  };
  return (
    <div className={styles.tools}>
      <button
        type="button"
        id="field-scene.surfaces"
        className={buttons.quiet}
        aria-label="Add a surface"
        onClick={add}
      >
        <Plus aria-hidden size={14} /> Add a surface
      </button>
      <p className={styles.aside}>
        Ground with a friction of its own. It counts where the travel is simulated to a rest pose; where surfaces
        overlap, the last one counts.
      </p>
    </div>
  );
}
