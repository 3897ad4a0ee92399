'use client';
import { type ReactNode, createContext, useContext } from 'react';
import { useStore } from 'zustand';
import type { Session, SessionActions, SessionState } from '@/lib/session/session';

const SessionContext = createContext<Session | null>(null);

export function SessionProvider({ session, children }: { session: Session; children: ReactNode }) {
  return <SessionContext value={session}>{children}</SessionContext>;
}

/** The session store itself, for reading at the time of an event. */
export function useSessionStore(): Session {
  const session = useContext(SessionContext);
  if (!session) throw new Error('useSessionStore: no SessionProvider above');
  return session;
}

/** A part of the session; the component renders again when that part changes. */
export function useSession<T>(select: (state: SessionState & SessionActions) => T): T {
  return useStore(useSessionStore(), select);
}
