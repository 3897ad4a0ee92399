'use client';
import { Plus, Trash2 } from 'lucide-react';
import { useSession } from '@/components/hooks/use-session';
import buttons from '@/components/ui/button.module.css';
import { LEVEL_SLOPE, defaultDeparture, defaultLeg, defaultSpin } from '@/lib/casefile/defaults';
import { wheelsTogether } from '@/lib/casefile/wheels';
import type { CaseFile, Departure, SpinDeparture, VehicleId } from '@/lib/casefile/schema';
import { focusNext } from './focus-next';
import { LedgerMark } from './ledger-mark';
import styles from './ledger.module.css';
import { WheelsButton } from './wheels-button';

/** Lengths that are added to begin with, m. */
const FIRST = 5;
const NEXT = 2;

/** A rest pose straight ahead of the pose at contact, to begin with. */
function restAhead({ x, y, heading }: CaseFile['impact']['A']): Departure {
  const turn = (heading.value * Math.PI) / 180;
  const place = (from: number, along: number): number => Number((from + FIRST * along).toFixed(2));
  return defaultSpin(place(x.value, Math.cos(turn)), place(y.value, Math.sin(turn)), heading.value);
}

/** Adds and takes away the travel of a vehicle: its legs, or its rest pose. */
export function LedgerTravel({ id, mark }: { id: VehicleId; mark: string | null }) {
  const departure = useSession((s) => s.casefile.departure[id] ?? null);
  const pose = useSession((s) => s.casefile.impact[id]);
  const heading = pose.heading.value;
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
        <button
          type="button"
          className={buttons.quiet}
          onClick={() => {
            edit(`add the rest pose of ${id}`, { do: 'set', path: `departure.${id}`, to: restAhead(pose) });
            focusNext(`field-departure.${id}.rest.x`);
          }}
        >
          <Plus aria-hidden size={14} /> Add the rest pose of {id}
        </button>
      </div>
    );
  if (departure.kind === 'spin') return <RestTools id={id} spin={departure} />;
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

/** What can be said of travel that is simulated to a measured rest pose. */
function RestTools({ id, spin }: { id: VehicleId; spin: SpinDeparture }) {
  const edit = useSession((s) => s.edit);
  const at = `departure.${id}`;
  const together = 'all' in spin.wheels;
  const tool = (words: string, path: string, to: unknown) => (
    <button
      type="button"
      className={buttons.quiet}
      aria-label={`${words}, ${id}`}
      onClick={() => {
        edit(`${words.toLowerCase()} (${id})`, { do: 'set', path, to });
        if (path === at) focusNext(`field-departure.${id}`);
      }}
    >
      {words}
    </button>
  );
  return (
    <div className={styles.tools}>
      <WheelsButton id={id} onDone={() => focusNext(`field-${at}.wheels.${together ? 'frontLeft' : 'all'}.braking`)} />
      {spin.slope ? tool('Level ground', `${at}.slope`, null) : tool('State a slope', `${at}.slope`, LEVEL_SLOPE)}
      {tool('Take away the travel', at, null)}
      {!together && !wheelsTogether(spin.wheels) && (
        <p className={styles.aside}>
          One braking for all wheels is offered again once all four brake alike and each steer is exactly 0°.
        </p>
      )}
    </div>
  );
}
