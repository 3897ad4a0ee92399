'use client';
import { useSession, useSessionStore } from '@/components/hooks/use-session';
import buttons from '@/components/ui/button.module.css';
import type { VehicleId } from '@/lib/casefile/schema';
import { wheelsSetApart, wheelsSetTogether } from '@/lib/session/wheel-edits';

/** Sets the wheels of a vehicle one by one, or all by one braking again where that loses nothing. */
export function WheelsButton({ id, onDone }: { id: VehicleId; onDone?: () => void }) {
  const casefile = useSession((s) => s.casefile);
  const session = useSessionStore();
  const apart = wheelsSetApart(casefile, id);
  const change = apart ?? wheelsSetTogether(casefile, id);
  if (!change) return null;
  const words = apart ? 'Set each wheel' : 'One braking for all wheels';
  return (
    <button
      type="button"
      className={buttons.quiet}
      aria-label={`${words}, ${id}`}
      onClick={() => {
        const { edit, select } = session.getState();
        edit(change.label, change.edit);
        select(apart ? `wheel.${id}.frontLeft` : `rest.${id}`);
        onDone?.();
      }}
    >
      {words}
    </button>
  );
}
