'use client';
import { Plus, Trash2 } from 'lucide-react';
import { useSession } from '@/components/hooks/use-session';
import buttons from '@/components/ui/button.module.css';
import { defaultDeparture, defaultLeg } from '@/lib/casefile/defaults';
import type { VehicleId } from '@/lib/casefile/schema';
import { focusNext } from './focus-next';
import { LedgerMark } from './ledger-mark';
import styles from './ledger.module.css';

/** Lengths that are added to begin with, m. */
const FIRST = 5;
const NEXT = 2;

/** Adds and takes away the travel of a vehicle and its legs. */
export function LedgerTravel({ id, mark }: { id: VehicleId; mark: string | null }) {
  const departure = useSession((s) => s.casefile.departure[id] ?? null);
  const heading = useSession((s) => s.casefile.impact[id].heading.value);
  const edit = useSession((s) => s.edit);
  if (!departure)
    return (
      <div className={styles.tools}>
        {mark && <LedgerMark says={mark} />}
        <button
          type="button"
          id={`field-departure.${id}`}
          className={buttons.button}
          onClick={() => {
            edit(`add the travel of ${id}`, {
              do: 'set',
              path: `departure.${id}`,
              to: defaultDeparture(heading, FIRST),
            });
            focusNext(`field-departure.${id}.direction`);
          }}
        >
          <Plus aria-hidden size={14} /> Add the travel of {id}
        </button>
      </div>
    );
  if (departure.kind === 'spin')
    return (
      <p className={styles.note}>Travel simulated to rest is kept in the file; this version does not solve it yet.</p>
    );
  const { legs } = departure;
  return (
    <div className={styles.tools}>
      <button
        type="button"
        className={buttons.quiet}
        aria-label={`Add a leg of ${id}`}
        id={`field-departure.${id}.legs`}
        onClick={() => {
          edit(`add a leg of ${id}`, {
            do: 'insert',
            path: `departure.${id}.legs`,
            index: legs.length,
            entry: defaultLeg(NEXT),
          });
          focusNext(`field-departure.${id}.legs.${legs.length}.distance`);
        }}
      >
        <Plus aria-hidden size={14} /> Add a leg
      </button>
      {legs.length > 1 && (
        <button
          type="button"
          className={buttons.quiet}
          aria-label={`Take away leg ${legs.length} of ${id}`}
          onClick={() => {
            edit(`take away leg ${legs.length} of ${id}`, {
              do: 'remove',
              path: `departure.${id}.legs`,
              index: legs.length - 1,
            });
            focusNext(`field-departure.${id}.legs`);
          }}
        >
          <Trash2 aria-hidden size={14} /> Take away leg {legs.length}
        </button>
      )}
      <button
        type="button"
        className={buttons.quiet}
        aria-label={`Take away the travel of ${id}`}
        onClick={() => {
          edit(`take away the travel of ${id}`, { do: 'set', path: `departure.${id}`, to: null });
          focusNext(`field-departure.${id}`);
        }}
      >
        <Trash2 aria-hidden size={14} /> Take away the travel
      </button>
    </div>
  );
}
