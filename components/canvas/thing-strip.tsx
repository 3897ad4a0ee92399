import { useMemo } from 'react';
import { useSession } from '@/components/hooks/use-session';
import { type BoardItem, type Spoken, boardList, standsFor } from '@/lib/session/board-list';
import type { Dimension, UnitSystem } from '@/lib/units/dimension';
import { formatWithUnit } from '@/lib/units/format';
import styles from './board.module.css';

const KEYS = 'Arrow keys move it, [ and ] turn it, Shift for larger and Alt for finer steps; Enter opens its numbers';

const WHEEL_KEYS =
  'Left and right steer it, up and down brake it more and less, Shift for larger and Alt for finer steps; Enter opens its numbers';
const keysOf = ({ thing }: BoardItem): string => (thing.startsWith('wheel.') ? WHEEL_KEYS : KEYS);

function spoken(units: UnitSystem): Spoken {
  const as = (dimension: Dimension, decimals: number) => (value: number) =>
    formatWithUnit(value, dimension, units, { decimals });
  return { length: as('length', 2), angle: as('angle', 1), ratio: as('ratio', 2) };
}

/** Everything on the board as a list that can be walked: focus selects, keys move what is selected. */
export function ThingStrip() {
  const casefile = useSession((s) => s.casefile);
  const selection = useSession((s) => s.selection);
  const select = useSession((s) => s.select);
  const edit = useSession((s) => s.edit);
  const items = useMemo(() => boardList(casefile, spoken(casefile.display?.units ?? 'metric')), [casefile]);
  return (
    <ul className={styles.strip} aria-label="Things on the board">
      {items.map((item) => (
        <li key={item.thing}>
          <button
            type="button"
            aria-pressed={standsFor(item, items, selection)}
            aria-label={item.says}
            title={item.add ? item.says : `${item.says}. ${keysOf(item)}`}
            className={item.add ? styles.missing : undefined}
            onFocus={() => {
              if (!item.add) select(item.thing);
            }}
            onKeyDown={(event) => {
              // Enter on what is missing adds it; on what is there it goes on to the board, which opens its numbers.
              if (event.key === 'Enter' && item.add) event.stopPropagation();
            }}
            onClick={() => {
              if (item.add) edit(item.add.label, item.add.edit);
              select(item.thing);
            }}
          >
            {item.add ? `+ ${item.name}` : item.name}
          </button>
        </li>
      ))}
    </ul>
  );
}
