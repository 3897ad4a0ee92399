import { Pause, Play } from 'lucide-react';
import { type KeyboardEvent, useMemo } from 'react';
import { useSession } from '@/components/hooks/use-session';
import { TableView } from '@/components/report/table-view';
import { type Travels, endOf } from '@/lib/geometry/timed-path';
import { ILLUSTRATION, travelTable } from '@/lib/report/travel-table';
import { formatWithUnit } from '@/lib/units/format';
import { type TravelClock, useTravelTime } from './travel-clock';
import styles from './travel-scrubber.module.css';
import { usePlay } from './use-play';
import { useReducedMotion } from './use-reduced-motion';

/** Presses of an arrow key in a second. */
const STEPS = 100;

const seconds = (time: number): string => formatWithUnit(time, 'time', 'metric', { decimals: 2 });

/** Enter belongs to the button that has the focus, not to the board around it. */
const keepEnter = (event: KeyboardEvent): void => {
  if (event.key === 'Enter') event.stopPropagation();
};

/** Moves along the simulated travel: one time for both vehicles, from first contact to the last rest. */
export function TravelScrubber({ travels, clock }: { travels: Travels; clock: TravelClock }) {
  // On a step of the range, which would else move its value to the step before.
  const end = Math.ceil(endOf(travels) * STEPS) / STEPS;
  const time = useTravelTime(clock, end);
  const { playing, toggle, pause } = usePlay(clock, end);
  const isStill = useReducedMotion();
  return (
    <div
      className={styles.scrubber}
      data-travel
      role="group"
      aria-label="Simulated travel"
      aria-describedby="travel-illustration"
    >
      {!isStill && (
        <button
          type="button"
          className={styles.play}
          aria-label={playing ? 'Pause' : 'Play'}
          onKeyDown={keepEnter}
          onClick={toggle}
        >
          {playing ? <Pause /> : <Play />}
        </button>
      )}
      <input
        type="range"
        aria-label="Time from first contact"
        aria-valuetext={spoken(time, travels)}
        min={0}
        max={end}
        step={1 / STEPS}
        value={time}
        onChange={(event) => {
          pause();
          clock.setState({ time: event.target.valueAsNumber });
        }}
      />
      <output className={styles.time} aria-hidden>
        {seconds(time)}
      </output>
      <p id="travel-illustration" className={styles.illustration}>
        {ILLUSTRATION}
      </p>
      <Figures travels={travels} />
    </div>
  );
}

/** «0.42 s from first contact, A at rest». */
function spoken(time: number, travels: Travels): string {
  const still = (['A', 'B'] as const).filter((id) => travels[id] && time >= endOf({ [id]: travels[id] }));
  return [`${seconds(time)} from first contact`, ...still.map((id) => `${id} at rest`)].join(', ');
}

/** The same travel as a table. */
function Figures({ travels }: { travels: Travels }) {
  const casefile = useSession((s) => s.casefile);
  const table = useMemo(() => travelTable(casefile, travels), [casefile, travels]);
  return (
    <details className={styles.figures}>
      <summary onKeyDown={keepEnter}>Figures</summary>
      {/* What scrolls must be reachable by keyboard. */}
      {/* oxlint-disable-next-line jsx-a11y/no-noninteractive-tabindex */}
      <div className={styles.table} role="region" aria-label="Figures of the simulated travel" tabIndex={0}>
        <TableView table={table} />
      </div>
    </details>
  );
}
