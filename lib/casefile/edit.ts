import { DEFAULT_SOURCE, DRAWN_SOURCE } from './defaults';
import type { Issue } from './issue';
import { checkCase } from './parse';
import { isQuantity, nodeAt, supportOf } from './quantities';
import type { CaseFile, Quantity, Spread } from './schema';

/**
 * Edits are data. A drag, a field, a key and a test send the same ones; applyEdit is the one place that applies them.
 * Paths are dotted; values are SI, angles in degrees.
 */
export type Edit =
  /** Moves a quantity's value and takes its limits along; its spread keeps its size. */
  | { do: 'value'; path: string; value: number; source?: string }
  /** Sets any node: a quantity, a departure, a name, the method. null takes it away. */
  | { do: 'set'; path: string; to: unknown }
  /** Puts an entry into a list before `index` (the length appends). */
  | { do: 'insert'; path: string; index: number; entry: unknown }
  /** Takes an entry out of a list. */
  | { do: 'remove'; path: string; index: number }
  /** Several edits as one. */
  | { do: 'all'; edits: Edit[] };

export type Edited = { ok: true; casefile: CaseFile } | { ok: false; issues: Issue[] };

/** Applies an edit to a valid case. What would make the case invalid is refused with its problems; the case is never changed in place. */
export function applyEdit(casefile: CaseFile, edit: Edit): Edited {
  const changed = applied(casefile, edit);
  if (changed === casefile) return { ok: true, casefile };
  const checked = checkCase(changed);
  return checked.ok ? { ok: true, casefile: changed as CaseFile } : checked;
}

function applied(document: unknown, edit: Edit): unknown {
  switch (edit.do) {
    case 'all':
      return edit.edits.reduce(applied, document);
    case 'value': {
      const node = nodeAt(document, edit.path);
      if (!isQuantity(node)) return replaced(document, edit.path.split('.'), edit.value);
      return replaced(document, edit.path.split('.'), shifted(edit, node));
    }
    case 'set':
      return Object.is(nodeAt(document, edit.path), edit.to)
        ? document
        : replaced(document, edit.path.split('.'), edit.to);
    case 'insert': {
      const list = (nodeAt(document, edit.path) as unknown[] | null | undefined) ?? [];
      return replaced(document, edit.path.split('.'), list.toSpliced(edit.index, 0, edit.entry));
    }
    case 'remove': {
      const list = (nodeAt(document, edit.path) as unknown[] | null | undefined) ?? [];
      return replaced(document, edit.path.split('.'), list.toSpliced(edit.index, 1));
    }
  }
}

/** The quantity at another value: limits move along, a default becomes drawn. */
function shifted({ path, value, source }: Edit & { do: 'value' }, quantity: Quantity): Quantity {
  const moved = movedSpread(path, quantity, value);
  const said = source ?? (quantity.source === DEFAULT_SOURCE ? DRAWN_SOURCE : quantity.source);
  return { value, ...(moved ? { spread: moved } : {}), ...(said === undefined ? {} : { source: said }) };
}

/** Limits end where what they limit cannot go on: a share of 0.5 ± 0.3 that becomes 0.9 reaches from 0.6 to 1. */
function movedSpread(path: string, { value: from, spread }: Quantity, to: number): Spread | undefined {
  if (!spread || spread.shape === 'fixed' || spread.shape === 'normal') return spread;
  const by = to - from;
  const { low, high, lowOpen } = supportOf(path);
  const least = lowOpen || to < low ? -Infinity : low;
  const most = to > high ? Infinity : high;
  return { ...spread, low: Math.max(least, spread.low + by), high: Math.min(most, spread.high + by) };
}

function replaced(node: unknown, path: string[], to: unknown): unknown {
  const [key, ...rest] = path;
  if (key === undefined) return to;
  if (Array.isArray(node)) return node.with(Number(key), replaced(node[Number(key)], rest, to));
  const record = (node ?? {}) as Record<string, unknown>;
  return { ...record, [key]: replaced(record[key], rest, to) };
}
