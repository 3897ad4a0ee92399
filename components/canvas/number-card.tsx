import { useState } from 'react';
import { useSession, useSessionStore } from '@/components/hooks/use-session';
import { WheelsButton } from '@/components/panels/wheels-button';
import { type Field, type ThingId, fieldsOf } from '@/lib/casefile/fields';
import { isQuantity, nodeAt } from '@/lib/casefile/quantities';
import type { CaseFile } from '@/lib/casefile/schema';
import { inkOf, placeBeside } from '@/lib/scene/beside';
import type { Speeds } from '@/lib/scene/scene';
import { type Size, type View, toScreen } from '@/lib/scene/view';
import { shownScene } from '@/lib/session/shown-scene';
import { placeOf } from '@/lib/session/place-of';
import { formatValue, unitOf } from '@/lib/units/format';
import { parseEntry } from '@/lib/units/parse';
import styles from './board.module.css';

/** The numbers that place the selected thing: what the board draws of it. */
const PLACES =
  /^(impact\.[AB]\.(x|y|heading)|impact\.point\.[xy]|impact\.plane|approach\.[AB]\.direction|departure\.[AB]\.direction|departure\.[AB]\.rest\.(x|y|heading)|departure\.[AB]\.legs\.\d+\.distance|departure\.[AB]\.wheels\.\w+\.(braking|steer)|scene\.surfaces\.\d+\.friction)$/;

function fieldsOfThing(casefile: CaseFile, thing: ThingId): Field[] {
  const all = fieldsOf(casefile).filter(({ path }) => PLACES.test(path) && isQuantity(nodeAt(casefile, path)));
  const own = all.filter((f) => f.thing === thing);
  const [kind, which] = thing.split('.');
  if (kind === 'departure') return [...own, ...all.filter((f) => f.thing.startsWith(`leg.${which}.`))];
  if (thing === 'contact.point') return [...own, ...all.filter(({ path }) => path === 'impact.plane')];
  return own;
}

/** Pixels: the card's width, a row, and what surrounds the rows. */
const CARD = { width: 190, row: 29, around: 18 };
/** What the card keeps clear of: the tools to the left, the hint above, the strip below, pixels. */
const CLEAR = { left: 64, top: 48, right: 8, bottom: 52 };

interface Props {
  thing: ThingId;
  view: View;
  size: Size;
  speeds: Speeds;
}

/** Beside the selected thing: its numbers, to type. Not modal; Escape steps back. */
export function NumberCard({ thing, view, size, speeds }: Props) {
  const casefile = useSession((s) => s.casefile);
  const moving = useSession((s) => s.gesture !== null);
  // While something moves the card stays where it was.
  const placedBy = useSession((s) => s.gesture?.casefile ?? s.casefile);
  const fields = fieldsOfThing(casefile, thing);
  if (fields.length === 0) return null;
  const opened = shownScene(casefile, thing).open;
  const rows = fields.length + (opened ? 1 : 0);
  const card = { width: CARD.width, height: rows * CARD.row + CARD.around };
  const scene = shownScene(placedBy, thing);
  const at = toScreen(view, placeOf(scene, thing, speeds));
  const [left, top] = placeBeside(at, card, size, CLEAR, inkOf(scene, speeds, view));
  return (
    <div
      className={styles.card}
      style={{ left, top }}
      data-numbers
      data-moving={moving}
      role="group"
      aria-label="Numbers of what is selected"
    >
      {fields.map((f) => (
        <CardNumber key={f.path} field={f} casefile={casefile} />
      ))}
      {opened && <WheelsButton id={opened} onDone={focusCard} />}
    </div>
  );
}

/** Goes to the first number of the card, which may first have to change. */
const focusCard = (): void => {
  requestAnimationFrame(() => document.querySelector<HTMLInputElement>('[data-numbers] input')?.select());
};

/** Short words: the card stands beside the thing, so its name need not be said again. */
const shortLabel = ({ path, label }: Field): string => {
  const leg = /legs\.(\d+)\.distance$/.exec(path);
  if (leg) return `Leg ${Number(leg[1]) + 1}`;
  if (path.endsWith('.x')) return 'x';
  if (path.endsWith('.y')) return 'y';
  if (path.endsWith('heading')) return 'Heading';
  if (path.endsWith('plane')) return 'Plane';
  if (path.endsWith('friction')) return 'Friction';
  if (path.endsWith('braking')) return 'Braking';
  if (path.endsWith('steer')) return 'Steer';
  return path.endsWith('direction') ? 'Direction' : label;
};

function CardNumber({ field, casefile }: { field: Field; casefile: CaseFile }) {
  const session = useSessionStore();
  const units = casefile.display?.units ?? 'metric';
  const dimension = field.dimension ?? 'ratio';
  const quantity = nodeAt(casefile, field.path) as { value: number };
  const shown = formatValue(quantity.value, dimension, units, { decimals: dimension === 'angle' ? 1 : 2 });
  const [draft, setDraft] = useState<string | null>(null);
  const [wrong, setWrong] = useState<string | null>(null);

  function commit(): void {
    const text = draft;
    setDraft(null);
    if (text === null || text === shown) return setWrong(null);
    const entry = parseEntry(text, dimension, units);
    if (!entry.ok) return setWrong(entry.says);
    const edit = { do: 'value', path: field.path, value: entry.value, source: 'entered' } as const;
    const issues = session.getState().edit(field.label, edit);
    setWrong(issues[0]?.says ?? null);
  }

  return (
    <label className={styles.number}>
      <span>{shortLabel(field)}</span>
      <input
        value={draft ?? shown}
        aria-label={`${field.label}, on the board`}
        aria-invalid={wrong !== null}
        inputMode="decimal"
        onChange={(event) => setDraft(event.target.value)}
        onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === 'Enter') commit();
          if (event.key === 'Escape') {
            event.stopPropagation();
            setWrong(null);
            if (draft === null) backToList(event.currentTarget);
            else setDraft(null);
          }
        }}
      />
      <span>{unitOf(dimension, units).symbol}</span>
      {wrong && (
        <em role="alert" className={styles.wrong}>
          {wrong}
        </em>
      )}
    </label>
  );
}

/** Steps back from the numbers to the entry of the list that they belong to. */
function backToList(input: HTMLElement): void {
  const board = input.closest('[role=group][tabindex]');
  const entry = board?.querySelector<HTMLElement>('li [aria-pressed=true]') ?? board;
  if (entry instanceof HTMLElement) entry.focus();
}
