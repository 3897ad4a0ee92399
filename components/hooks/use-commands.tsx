'use client';
import { type ReactNode, createContext, useCallback, useContext, useEffect, useMemo, useRef } from 'react';
import { type Command, commandsOf } from '@/lib/session/commands';
import { useSessionStore } from './use-session';
import { useShow } from './use-show';

type Handler = () => void;

interface Commands {
  /** What can be done now. */
  list: () => Command[];
  run: (command: Command) => void;
  /** Takes on a command that the session cannot do itself; returns how to let go of it. */
  takeOn: (id: string, handler: Handler) => () => void;
}

const CommandsContext = createContext<Commands | null>(null);

export function useCommands(): Commands {
  const commands = useContext(CommandsContext);
  if (!commands) throw new Error('useCommands: no CommandsProvider above');
  return commands;
}

/** Runs commands: the session's own, and those that a part of the page has taken on. */
export function CommandsProvider({ children }: { children: ReactNode }) {
  const session = useSessionStore();
  const { showField } = useShow();
  const taken = useRef(new Map<string, Handler>());

  const takeOn = useCallback((id: string, handler: Handler) => {
    taken.current.set(id, handler);
    return () => {
      if (taken.current.get(id) === handler) taken.current.delete(id);
    };
  }, []);
  const list = useCallback(() => {
    const { casefile, selection } = session.getState();
    return commandsOf(casefile, selection).filter(({ id, does }) => does.do !== 'ask' || taken.current.has(id));
  }, [session]);
  const run = useCallback(
    ({ id, does }: Command): void => {
      const { use, undo, redo, edit, select } = session.getState();
      switch (does.do) {
        case 'use':
          return use(does.tool);
        case 'undo':
          return undo();
        case 'redo':
          return redo();
        case 'edit':
          return void edit(does.label, does.edit);
        case 'delete':
          edit(does.label, does.edit);
          return select(null);
        case 'select':
          return select(does.thing);
        case 'row':
          return showField(does.path);
        case 'ask':
          return taken.current.get(id)?.();
      }
    },
    [session, showField],
  );
  const commands = useMemo(() => ({ list, run, takeOn }), [list, run, takeOn]);
  return <CommandsContext value={commands}>{children}</CommandsContext>;
}

/** Takes on commands by id for as long as the component lives; `handlers` may be new at every rendering. */
export function useTakeOn(handlers: Record<string, Handler>): void {
  const { takeOn } = useCommands();
  const latest = useRef(handlers);
  useEffect(() => {
    latest.current = handlers;
  });
  const ids = Object.keys(handlers).join(' ');
  useEffect(() => {
    const release = ids.split(' ').map((id) => takeOn(id, () => latest.current[id]()));
    return () => release.forEach((letGo) => letGo());
  }, [ids, takeOn]);
}
