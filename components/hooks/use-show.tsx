'use client';
import { type ReactNode, createContext, useCallback, useContext, useMemo, useState } from 'react';
import { fieldsOf } from '@/lib/casefile/fields';
import { useSessionStore } from './use-session';

interface Show {
  /** Whether the ledger is open where it is a drawer. */
  isLedgerOpen: boolean;
  openLedger: (open: boolean) => void;
  /** Selects what a path of the case belongs to and takes the reader to its row in the ledger. */
  showField: (path: string) => void;
}

const ShowContext = createContext<Show | null>(null);

export function useShow(): Show {
  const show = useContext(ShowContext);
  if (!show) throw new Error('useShow: no ShowProvider above');
  return show;
}

/** Takes readers from a place that speaks of a value to the value itself. */
export function ShowProvider({ children }: { children: ReactNode }) {
  const session = useSessionStore();
  const [isLedgerOpen, openLedger] = useState(false);
  const showField = useCallback(
    (path: string): void => {
      const field = fieldsOf(session.getState().casefile).find(
        (f) => path === f.path || path.startsWith(`${f.path}.`) || f.path.startsWith(`${path}.`),
      );
      if (field) session.getState().select(field.thing);
      openLedger(true);
      // The row may first have to unfold, and a drawer to open.
      requestAnimationFrame(() => requestAnimationFrame(() => focusRow(path, field?.path)));
    },
    [session],
  );
  const show = useMemo(() => ({ isLedgerOpen, openLedger, showField }), [isLedgerOpen, showField]);
  return <ShowContext value={show}>{children}</ShowContext>;
}

/** The row of the path itself, or the first of the group that it names, or the ledger as a whole. */
function focusRow(...paths: (string | undefined)[]): void {
  const row = paths.map((path) => path && document.getElementById(`field-${path}`)).find((found) => !!found);
  const target = row || document.getElementById('ledger');
  target?.closest('details')?.setAttribute('open', '');
  target?.scrollIntoView({ block: 'nearest' });
  target?.focus({ preventScroll: true });
}
