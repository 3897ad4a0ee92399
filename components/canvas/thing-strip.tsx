import { useAnswer } from '@/components/hooks/use-answer';
import { useSession } from '@/components/hooks/use-session';
import { defaultDeparture, drawnQuantity } from '@/lib/casefile/defaults';
import type { Edit } from '@/lib/casefile/edit';
import type { ThingId } from '@/lib/casefile/fields';
import type { CaseFile, Quantity } from '@/lib/casefile/schema';
import { formatWithUnit } from '@/lib/units/format';
import styles from './board.module.css';

interface Item {
  name: string;
  /** Its numbers in words, for those who cannot see the drawing. */
  says: string;
  thing: ThingId;
  /** Where it is not drawn yet: what draws it. */
  add?: { label: string; edit: Edit };
}

const both = ['A', 'B'] as const;

function itemsOf(casefile: CaseFile): Item[] {
  const units = casefile.display?.units ?? 'metric';
  const { impact, approach, departure } = casefile;
  const length = (q: Quantity): string => formatWithUnit(q.value, 'length', units, { decimals: 2 });
  const angle = (q: Quantity): string => formatWithUnit(q.value, 'angle', units, { decimals: 1 });
  return [
    ...both.map((id): Item => ({
      name: id,
      thing: `vehicle.${id}`,
      says: `Vehicle ${id}, mass centre at ${length(impact[id].x)}, ${length(impact[id].y)}, heading ${angle(impact[id].heading)}`,
    })),
    {
      name: 'Contact point',
      thing: 'contact.point',
      says: `Contact point at ${length(impact.point.x)}, ${length(impact.point.y)}`,
    },
    { name: 'Plane', thing: 'contact.plane', says: `Contact plane, direction ${angle(impact.plane)}` },
    ...both.map((id): Item => {
      const direction = approach[id].direction;
      const heading = impact[id].heading.value;
      return direction
        ? { name: `Approach ${id}`, thing: `approach.${id}`, says: `Approach of ${id}, direction ${angle(direction)}` }
        : {
            name: `Approach ${id}`,
            thing: `approach.${id}`,
            says: `Add the approach of ${id}, along its heading`,
            add: {
              label: `add the approach of ${id}`,
              edit: { do: 'set', path: `approach.${id}.direction`, to: drawnQuantity(heading, 3) },
            },
          };
    }),
    ...both.flatMap((id): Item[] => {
      const travel = departure[id];
      const heading = impact[id].heading.value;
      if (travel?.kind === 'spin') return [];
      if (!travel)
        return [
          {
            name: `Travel ${id}`,
            thing: `departure.${id}`,
            says: `Add the travel of ${id}, straight on for 5 metres`,
            add: {
              label: `add the travel of ${id}`,
              edit: { do: 'set', path: `departure.${id}`, to: defaultDeparture(heading, 5) },
            },
          },
        ];
      const whole: Item = {
        name: `Travel ${id}`,
        thing: `departure.${id}`,
        says: `Travel of ${id}, direction ${angle(travel.direction)}, ${travel.legs.map((leg) => length(leg.distance)).join(' then ')}`,
      };
      const legs = travel.legs.map((leg, k): Item => ({
        name: `Leg ${k + 1}`,
        thing: `leg.${id}.${k}`,
        says: `Leg ${k + 1} of ${id}, ${length(leg.distance)}`,
      }));
      return travel.legs.length > 1 ? [whole, ...legs] : [whole];
    }),
  ];
}

/** Everything on the board as a list that can be walked: focus selects, the arrow keys and brackets move what is selected. */
export function ThingStrip() {
  const casefile = useSession((s) => s.casefile);
  const selection = useSession((s) => s.selection);
  const select = useSession((s) => s.select);
  const edit = useSession((s) => s.edit);
  const { result } = useAnswer();
  return (
    <ul className={styles.strip} aria-label="Things on the board" data-solved={result !== null}>
      {itemsOf(casefile).map(({ name, says, thing, add }) => (
        <li key={thing}>
          <button
            type="button"
            aria-pressed={selection === thing && !add}
            aria-label={says}
            title={add ? says : `${says}. Arrow keys move it, [ and ] turn it; Shift for larger, Alt for finer steps`}
            className={add ? styles.missing : undefined}
            onFocus={() => {
              if (!add) select(thing);
            }}
            onClick={() => {
              if (add) edit(add.label, add.edit);
              select(thing);
            }}
          >
            {add ? `+ ${name}` : name}
          </button>
        </li>
      ))}
    </ul>
  );
}
