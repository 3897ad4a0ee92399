'use client';
import { type KeyboardEvent, useCallback, useEffect, useId, useRef, useState } from 'react';
import { useCommands } from '@/components/hooks/use-commands';
import buttons from '@/components/ui/button.module.css';
import { type Command, matching } from '@/lib/session/commands';
import styles from './command-palette.module.css';

/** Whether typing goes into a field. */
const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement && target.closest('input, select, textarea, [contenteditable]') !== null;

const opens = (event: globalThis.KeyboardEvent): boolean =>
  (event.key.toLowerCase() === 'k' && (event.ctrlKey || event.metaKey) && !event.altKey) ||
  (event.key === '?' && !isTyping(event.target));

/** Every command with its key, found by typing: Ctrl K (Cmd K), or the question mark. */
export function CommandPalette() {
  const { list } = useCommands();
  const dialog = useRef<HTMLDialogElement>(null);
  const [commands, setCommands] = useState<Command[] | null>(null);
  const close = (): void => dialog.current?.close();
  const open = useCallback((): void => {
    setCommands(list());
    dialog.current?.showModal();
  }, [list]);
  useEffect(() => {
    const onKey = (event: globalThis.KeyboardEvent): void => {
      if (!opens(event)) return;
      event.preventDefault();
      if (dialog.current?.open) dialog.current.close();
      else open();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [open]);
  return (
    <>
      <button
        type="button"
        className={`${buttons.quiet} ${styles.trigger}`}
        aria-keyshortcuts="Control+K ?"
        onClick={open}
      >
        Commands <kbd>Ctrl K</kbd>
      </button>
      <dialog
        ref={dialog}
        className={styles.dialog}
        aria-label="Commands"
        closedby="any"
        onClose={() => setCommands(null)}
      >
        {commands && <Finder commands={commands} onDone={close} />}
      </dialog>
    </>
  );
}

/** A field with the list of what it finds (WAI-ARIA practices: editable combobox with list). */
function Finder({ commands, onDone }: { commands: readonly Command[]; onDone: () => void }) {
  const { run } = useCommands();
  const id = useId();
  const [query, setQuery] = useState('');
  const [at, setAt] = useState(0);
  const field = useRef<HTMLInputElement>(null);
  const found = matching(commands, query);
  const current = found[at];
  useEffect(() => field.current?.focus(), []);
  useEffect(() => {
    document.getElementById(`${id}-${at}`)?.scrollIntoView({ block: 'nearest' });
  }, [id, at]);
  // Closed first: the focus goes back to where it was, and the command may move it on.
  const choose = (command: Command): void => {
    onDone();
    run(command);
  };
  const onKeyDown = (event: KeyboardEvent): void => {
    const to = moved(event.key, at, found.length);
    if (to !== null) setAt(to);
    else if (event.key === 'Enter' && current) choose(current);
    else return;
    event.preventDefault();
  };
  return (
    <div className={styles.finder}>
      <input
        ref={field}
        className={styles.field}
        role="combobox"
        aria-label="Find a command"
        aria-expanded="true"
        aria-controls={id}
        aria-activedescendant={current ? `${id}-${at}` : undefined}
        placeholder="Find a command, a thing on the board or a row of the ledger"
        autoComplete="off"
        spellCheck={false}
        value={query}
        onChange={(event) => {
          setQuery(event.target.value);
          setAt(0);
        }}
        onKeyDown={onKeyDown}
      />
      <div id={id} role="listbox" aria-label="Commands" className={styles.list}>
        {found.map((command, k) => (
          // The keys are the field's: an option is never focused itself.
          // oxlint-disable-next-line jsx-a11y/click-events-have-key-events, jsx-a11y/interactive-supports-focus
          <div
            key={command.id}
            id={`${id}-${k}`}
            role="option"
            aria-selected={k === at}
            className={styles.option}
            onPointerMove={() => setAt(k)}
            onClick={() => choose(command)}
          >
            <span>{command.title}</span>
            <small>{command.group}</small>
            {command.key && <kbd>{command.key}</kbd>}
          </div>
        ))}
      </div>
      {found.length === 0 && <p className={styles.none}>Nothing is called so.</p>}
      <p className={styles.foot}>
        ↑ ↓ choose · Enter does it · Esc closes · Ctrl K (on a Mac Cmd K) or ? opens this list.
        <br />
        On the board: arrows move what is selected, [ and ] turn it, with Shift ten times and with Alt a tenth as far;
        Enter goes to its numbers; Esc steps back; + and − zoom.
      </p>
    </div>
  );
}

/** Where an arrow key leads in a list; null for any other key. */
function moved(key: string, at: number, length: number): number | null {
  if (length === 0) return null;
  if (key === 'ArrowDown') return (at + 1) % length;
  if (key === 'ArrowUp') return (at - 1 + length) % length;
  if (key === 'PageDown') return Math.min(length - 1, at + 8);
  if (key === 'PageUp') return Math.max(0, at - 8);
  return null;
}
