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
  wide?: boolean;
  /** Words about a mark that the field carries. */
  describedBy?: string;
}

/** What is typed and not in force yet. */
interface Attempt {
  typed: string;
  /** The text in force when it was typed. */
  against: string;
  refused: string | null;
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
export function EntryField({ id, label, text, unit, onEnter, onStep, wide = false, describedBy }: EntryFieldProps) {
  const [attempt, setAttempt] = useState<Attempt | null>(null);
  const alertId = useId();
  // What was typed against another text is out of date: the value has changed elsewhere.
  const now = attempt?.against === text ? attempt : null;
  const refused = now?.refused ?? null;
  const input = useLeftAtPress(now !== null);

  const enter = (): void => {
    if (!now || now.typed === text) return setAttempt(null);
    const why = onEnter(now.typed);
    setAttempt(why === null ? null : { ...now, refused: why });
  };

  return (
    <span className={styles.field} data-wide={wide}>
      <span className={styles.box} data-refused={refused !== null}>
        <input
          ref={input}
          id={id}
          type="text"
          autoComplete="off"
          spellCheck={false}
          aria-label={label}
          aria-invalid={refused !== null}
          aria-describedby={[refused === null ? null : alertId, describedBy].filter(Boolean).join(' ') || undefined}
          value={now?.typed ?? text}
          onChange={(event) => setAttempt({ typed: event.target.value, against: text, refused: null })}
          onBlur={enter}
          onKeyDown={(event) => {
            if (event.key === 'Enter') enter();
            else if (event.key === 'Escape' && now) {
              event.stopPropagation();
              setAttempt(null);
            } else if (onStep && !now && (event.key === 'ArrowUp' || event.key === 'ArrowDown')) {
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

/**
 * What is typed takes effect before a press elsewhere is heard: left to itself the browser says so only afterwards, when
 * a drag may have begun from the old value.
 */
function useLeftAtPress(isTyping: boolean) {
  const input = useRef<HTMLInputElement>(null);
  useEffect(() => {
    if (!isTyping) return;
    const leave = (event: PointerEvent): void => {
      if (event.target !== input.current) input.current?.blur();
    };
    document.addEventListener('pointerdown', leave, { capture: true });
    return () => document.removeEventListener('pointerdown', leave, { capture: true });
  }, [isTyping]);
  return input;
}
