'use client';
import { Fragment, useEffect, useMemo, useRef, useState } from 'react';
import { useAnswer } from '@/components/hooks/use-answer';
import { useSession } from '@/components/hooks/use-session';
import { type Field, type GroupId, GROUPS, fieldsOf } from '@/lib/casefile/fields';
import { HEADLINES, type ResultName, resultLabel } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import type { UnitSystem } from '@/lib/units/dimension';
import { LedgerDamage } from './ledger-damage';
import { LedgerRow } from './ledger-row';
import { LedgerSeats } from './ledger-seats';
import { LedgerSettings } from './ledger-settings';
import { LedgerCorners, LedgerSurfaces } from './ledger-surfaces';
import { LedgerTravel } from './ledger-travel';
import styles from './ledger.module.css';

/** What is known: every value of the case as a row, grouped, with its share in the spread of a chosen result. */
export function Ledger() {
  const casefile = useSession((s) => s.casefile);
  const { result, issues } = useAnswer();
  const [traced, setTraced] = useState<ResultName>('A.approachSpeed');
  const units = casefile.display?.units ?? 'metric';
  const fields = useMemo(() => fieldsOf(casefile), [casefile]);
  const marks = useMemo(() => marksOf(fields, result, issues), [fields, result, issues]);
  const shares = result?.sensitivity[traced];
  const frame = useFollowedSelection();

  return (
    <div ref={frame} className={styles.ledger}>
      <div className={styles.head}>
        <h2>Ledger</h2>
        <label>
          <span>share in the spread of</span>
          <select
            aria-label="Result whose spread is traced"
            value={traced}
            onChange={(event) => setTraced(event.target.value as ResultName)}
          >
            {HEADLINES.map((name) => (
              <option key={name} value={name}>
                {resultLabel(name)}
              </option>
            ))}
          </select>
        </label>
      </div>
      {GROUPS.map(({ id, title }) => {
        const rows = fields.filter((field) => field.group === id);
        const marked = marksIn(marks, rows, id);
        return (
          <details key={id} open className={styles.group}>
            <summary>
              <h3>{title}</h3>
              {marked > 0 && <span className={styles.count}>{marked} to look at</span>}
            </summary>
            {rows.map((field) => (
              <Fragment key={field.path}>
                <LedgerRow
                  field={field}
                  units={units}
                  share={shares?.[field.path]?.total ?? null}
                  mark={marks.get(field.path) ?? null}
                />
                <BelowRow path={field.path} units={units} />
              </Fragment>
            ))}
            <GroupTools id={id} units={units} marks={marks} />
          </details>
        );
      })}
      <details open className={styles.group}>
        <summary>
          <h3>How it is solved and shown</h3>
        </summary>
        <LedgerSettings />
      </details>
    </div>
  );
}

/** The corners of a surface stand under the last of its rows. */
function BelowRow({ path, units }: { path: string; units: UnitSystem }) {
  const surface = /^scene\.surfaces\.(\d+)\.friction$/.exec(path);
  return surface ? <LedgerCorners index={Number(surface[1])} units={units} /> : null;
}

function GroupTools({ id, units, marks }: { id: GroupId; units: UnitSystem; marks: ReadonlyMap<string, string> }) {
  if (id === 'A' || id === 'B') return <LedgerSeats id={id} units={units} />;
  if (id === 'after.A') return <LedgerTravel id="A" mark={marks.get('departure.A') ?? null} />;
  if (id === 'after.B') return <LedgerTravel id="B" mark={marks.get('departure.B') ?? null} />;
  if (id === 'damage.A') return <LedgerDamage id="A" mark={marks.get(id) ?? null} />;
  if (id === 'damage.B') return <LedgerDamage id="B" mark={marks.get(id) ?? null} />;
  if (id === 'surfaces') return <LedgerSurfaces />;
  return null;
}

/** How many marks a group carries, so that a folded group says so too. */
const marksIn = (marks: ReadonlyMap<string, string>, rows: readonly Field[], id: GroupId): number =>
  rows.filter(({ path }) => marks.has(path)).length + (marks.has(id.replace('after', 'departure')) ? 1 : 0);

/** Why each path is pointed at: by the method, or by a check that speaks up. */
function marksOf(
  fields: readonly Field[],
  result: Result | null,
  issues: readonly { path: string; says: string }[],
): Map<string, string> {
  const marks = new Map<string, string>();
  // What names several rows, as a whole leg does, marks the first of them.
  const rowOf = (path: string): string =>
    fields.find((field) => field.path === path || field.path.startsWith(`${path}.`))?.path ?? path;
  for (const check of result?.checks ?? [])
    if (check.level === 'caution' || check.level === 'fail')
      for (const path of check.paths.map(rowOf)) if (!marks.has(path)) marks.set(path, check.says);
  for (const { path, says } of issues) marks.set(rowOf(path.replace(/\.(value|spread.*)$/, '')), says);
  return marks;
}

/** Scrolls the rows of what was selected elsewhere into view. */
function useFollowedSelection() {
  const frame = useRef<HTMLDivElement>(null);
  const selection = useSession((s) => s.selection);
  useEffect(() => {
    const element = frame.current;
    if (!selection || !element || element.contains(document.activeElement)) return;
    const rows = [...element.querySelectorAll(`[data-thing="${selection}"]`)];
    rows[0]?.closest('details')?.setAttribute('open', '');
    // First the end, then the beginning: as many of the rows as there is room for.
    rows.at(-1)?.scrollIntoView({ block: 'nearest' });
    rows[0]?.scrollIntoView({ block: 'nearest' });
  }, [selection]);
  return frame;
}
