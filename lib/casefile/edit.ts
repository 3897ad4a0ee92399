import { DEFAULT_SOURCE, DRAWN_SOURCE } from './defaults';
import type { Issue } from './issue';
import { checkCase } from './parse';
import { isQuantity, nodeAt } from './quantities';
import type { CaseFile, Quantity } from './schema';

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
      return replaced(document, edit.path.split('.'), shifted(node, edit.value, edit.source));
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
function shifted(quantity: Quantity, value: number, source: string | undefined): Quantity {
  const by = value - quantity.value;
  const { spread } = quantity;
  const moved =
    spread && (spread.shape === 'rectangular' || spread.shape === 'triangular')
      ? { ...spread, low: spread.low + by, high: spread.high + by }
      : spread;
  const said = source ?? (quantity.source === DEFAULT_SOURCE ? DRAWN_SOURCE : quantity.source);
  return { value, ...(moved ? { spread: moved } : {}), ...(said === undefined ? {} : { source: said }) };
}

function replaced(node: unknown, path: string[], to: unknown): unknown {
  const [key, ...rest] = path;
  if (key === undefined) return to;
  if (Array.isArray(node)) return node.with(Number(key), replaced(node[Number(key)], rest, to));
  const record = (node ?? {}) as Record<string, unknown>;
  return { ...record, [key]: replaced(record[key], rest, to) };
}
