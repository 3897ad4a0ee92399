'use client';
import { Plus, Trash2 } from 'lucide-react';
import { useSession } from '@/components/hooks/use-session';
import buttons from '@/components/ui/button.module.css';
import { defaultDamage, defaultDepth } from '@/lib/casefile/defaults';
import type { Edit } from '@/lib/casefile/edit';
import type { VehicleId } from '@/lib/casefile/schema';
import { focusNext } from './focus-next';
import { LedgerMark } from './ledger-mark';
import styles from './ledger.module.css';

/** As the case file allows. */
const [FEWEST, MOST] = [2, 12];

/** Adds and takes away the damage of a vehicle, and its depths. */
export function LedgerDamage({ id, mark }: { id: VehicleId; mark: string | null }) {
  const damage = useSession((s) => s.casefile.damage?.[id] ?? null);
  const edit = useSession((s) => s.edit);
  const at = `damage.${id}`;
  if (!damage)
    return (
      <div className={styles.tools}>
        {mark && <LedgerMark says={mark} />}
        <button
          type="button"
          id={`field-${at}`}
          className={buttons.quiet}
          onClick={() => {
            edit(`add the damage of ${id}`, { do: 'set', path: at, to: defaultDamage() });
            focusNext(`field-${at}.width`);
          }}
        >
          <Plus aria-hidden size={14} /> Add the damage of {id}
        </button>
      </div>
    );
  const { depths, stations } = damage;
  /** Stations that were measured for other depths are let go: the depths then stand evenly. */
  const reshaped = (change: Edit): Edit =>
    stations ? { do: 'all', edits: [{ do: 'set', path: `${at}.stations`, to: null }, change] } : change;
  return (
    <div className={styles.tools}>
      {depths.length < MOST && (
        <button
          type="button"
          className={buttons.quiet}
          aria-label={`Add a depth of ${id}`}
          id={`field-${at}.depths`}
          onClick={() => {
            const entry = defaultDepth();
            edit(`add a depth of ${id}`, reshaped({ do: 'insert', path: `${at}.depths`, index: depths.length, entry }));
            focusNext(`field-${at}.depths.${depths.length}`);
          }}
        >
          <Plus aria-hidden size={14} /> Add a depth
        </button>
      )}
      {depths.length > FEWEST && (
        <button
          type="button"
          className={buttons.quiet}
          aria-label={`Take away depth ${depths.length} of ${id}`}
          onClick={() => {
            edit(
              `take away depth ${depths.length} of ${id}`,
              reshaped({ do: 'remove', path: `${at}.depths`, index: depths.length - 1 }),
            );
            focusNext(`field-${at}.depths`);
          }}
        >
          <Trash2 aria-hidden size={14} /> Take away depth {depths.length}
        </button>
      )}
      <button
        type="button"
        className={buttons.quiet}
        aria-label={`Take away the damage of ${id}`}
        onClick={() => {
          edit(`take away the damage of ${id}`, { do: 'set', path: at, to: null });
          focusNext(`field-${at}`);
        }}
      >
        <Trash2 aria-hidden size={14} /> Take away the damage
      </button>
      <p className={styles.note}>
        {stations
          ? 'The depths stand at the stations of the case file.'
          : 'The depths stand evenly over the width, ends included; all of them 0 says that none remained.'}
      </p>
    </div>
  );
}
