'use client';
import { type KeyboardEvent, useEffect, useId, useRef, useState } from 'react';
import styles from './entry-field.module.css';

export interface EntryFieldProps {
  id?: string;
  /** What the field is, for those who cannot see where it stands. */
  label: string;
  /** The text in force. */
  text: string;
  unit?: string;
  /** Takes what was typed; answers why it was refused, or null. */
  onEnter: (text: string) => string | null;
  /** Steps the value by so many steps; absent where there is nothing to step. */
  onStep?: (steps: number) => void;
  onFocus?: () => void;
  wide?: boolean;
  /** Words about a mark that the field carries. */
  describedBy?: string;
}

/** One step, ten with Shift, a tenth with Alt. */
const stepsOf = (event: KeyboardEvent): number => {
  const size = event.shiftKey ? 10 : event.altKey ? 0.1 : 1;
  return event.key === 'ArrowUp' ? size : -size;
};

/**
 * A field that takes effect on Enter or when it is left. What is refused says why and stays to be mended; the last good
 * value stays in force. Escape puts that back.
 */
export function EntryField({
  id,
  label,
  text,
  unit,
  onEnter,
  onStep,
  onFocus,
  wide = false,
  describedBy,
}: EntryFieldProps) {
  const [draft, setDraft] = useState<string | null>(null);
  const [refused, setRefused] = useState<string | null>(null);
  const field = useRef<HTMLInputElement>(null);
  const alertId = useId();

  useEffect(() => {
    if (document.activeElement !== field.current) {
      setDraft(null);
      setRefused(null);
    }
  }, [text]);

  const enter = (): void => {
    if (draft === null || draft === text) {
      setDraft(null);
      setRefused(null);
      return;
    }
    const why = onEnter(draft);
    setRefused(why);
    if (why === null) setDraft(null);
  };
  const restore = (): void => {
    setDraft(null);
    setRefused(null);
  };

  return (
    <span className={styles.field} data-wide={wide}>
      <span className={styles.box} data-refused={refused !== null}>
        <input
          ref={field}
          id={id}
          type="text"
          autoComplete="off"
          spellCheck={false}
          aria-label={label}
          aria-invalid={refused !== null}
          aria-describedby={[refused === null ? null : alertId, describedBy].filter(Boolean).join(' ') || undefined}
          value={draft ?? text}
          onFocus={onFocus}
          onChange={(event) => setDraft(event.target.value)}
          onBlur={enter}
          onKeyDown={(event) => {
            if (event.key === 'Enter') enter();
            else if (event.key === 'Escape' && (draft !== null || refused !== null)) {
              event.stopPropagation();
              restore();
            } else if (onStep && draft === null && (event.key === 'ArrowUp' || event.key === 'ArrowDown')) {
              event.preventDefault();
              onStep(stepsOf(event));
            }
          }}
        />
        {unit && <span className={styles.unit}>{unit}</span>}
      </span>
      {refused && (
        <span id={alertId} role="alert" className={styles.refused}>
          {refused}
        </span>
      )}
    </span>
  );
}
