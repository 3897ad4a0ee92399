'use client';
import { Plus, X } from 'lucide-react';
import { useSession } from '@/components/hooks/use-session';
import buttons from '@/components/ui/button.module.css';
import { EntryField } from '@/components/ui/entry-field';
import type { VehicleId } from '@/lib/casefile/schema';
import type { UnitSystem } from '@/lib/units/dimension';
import { figureText } from '@/lib/units/entry';
import { unitOf } from '@/lib/units/format';
import { parseEntry } from '@/lib/units/parse';
import { focusNext } from './focus-next';
import styles from './ledger.module.css';

/** Places in a vehicle at which delta-V is wanted: forward and left of the mass centre. */
export function LedgerSeats({ id, units }: { id: VehicleId; units: UnitSystem }) {
  const seats = useSession((s) => s.casefile.vehicles[id].seats) ?? [];
  const edit = useSession((s) => s.edit);
  const path = `vehicles.${id}.seats`;
  const set = (index: number, key: string, to: unknown): string | null =>
    edit(`seat ${index + 1} of ${id}`, { do: 'set', path: `${path}.${index}.${key}`, to })[0]?.says ?? null;
  const length = (index: number, key: 'x' | 'y', label: string, value: number) => (
    <EntryField
      label={`${label} of seat ${index + 1} of ${id}`}
      text={figureText(value, 'length', units)}
      unit={unitOf('length', units).symbol}
      onEnter={(typed) => {
        const entry = parseEntry(typed, 'length', units);
        return entry.ok ? set(index, key, entry.value) : entry.says;
      }}
    />
  );
  return (
    <div className={styles.seats}>
      {seats.length > 0 && (
        <div className={styles.seatHead} aria-hidden>
          <span>Seat</span>
          <span>forward</span>
          <span>left</span>
        </div>
      )}
      {seats.map((seat, k) => (
        <div key={k} className={styles.seat}>
          <EntryField
            id={`field-${path}.${k}.name`}
            label={`Name of seat ${k + 1} of ${id}`}
            text={seat.name}
            wide
            onEnter={(name) => set(k, 'name', name)}
          />
          {length(k, 'x', 'Forward position', seat.x)}
          {length(k, 'y', 'Left position', seat.y)}
          <button
            type="button"
            className={styles.clear}
            aria-label={`Take away seat ${k + 1} of ${id}`}
            onClick={() => {
              edit(`take away seat ${k + 1} of ${id}`, { do: 'remove', path, index: k });
              focusNext(`field-${path}`);
            }}
          >
            <X aria-hidden />
          </button>
        </div>
      ))}
      <button
        type="button"
        className={buttons.quiet}
        id={`field-${path}`}
        aria-label={`Add a seat in ${id}`}
        onClick={() => {
          edit(`add a seat in ${id}`, {
            do: 'insert',
            path,
            index: seats.length,
            entry: { name: `Seat ${seats.length + 1}`, x: 0, y: 0 },
          });
          focusNext(`field-${path}.${seats.length}.name`);
        }}
      >
        <Plus aria-hidden size={14} /> Add a seat
      </button>
    </div>
  );
}
