import { type KeyboardEvent, type PointerEvent, useRef } from 'react';
import styles from './strip-edge.module.css';
import { HIGHEST, LOWEST, type Strip } from './use-strip';

/** Per press of an arrow key, px. */
const STEP = 16;

const heightOf = (edge: HTMLElement): number => edge.parentElement?.offsetHeight ?? LOWEST;

/** The upper edge of the answer: drawn up or down, or moved by the arrow keys. */
export function StripEdge({ strip }: { strip: Strip }) {
  const from = useRef<{ y: number; height: number } | null>(null);
  const onKeyDown = (event: KeyboardEvent<HTMLDivElement>): void => {
    const step = { ArrowUp: STEP, ArrowDown: -STEP }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    strip.setHeight(heightOf(event.currentTarget) + step);
  };
  const onPointerDown = (event: PointerEvent<HTMLDivElement>): void => {
    event.currentTarget.setPointerCapture(event.pointerId);
    from.current = { y: event.clientY, height: heightOf(event.currentTarget) };
  };
  const onPointerMove = (event: PointerEvent): void => {
    if (from.current) strip.setHeight(from.current.height + from.current.y - event.clientY);
  };
  const release = (): void => {
    from.current = null;
  };
  return (
    // A separator that can be moved is a widget (WAI-ARIA 1.2, separator), which the rule does not know.
    // oxlint-disable-next-line jsx-a11y/no-noninteractive-element-interactions
    <div
      className={styles.edge}
      role="separator"
      aria-orientation="horizontal"
      aria-label="Height of the answer"
      aria-valuemin={LOWEST}
      aria-valuemax={HIGHEST}
      aria-valuenow={strip.height ?? LOWEST}
      // oxlint-disable-next-line jsx-a11y/no-noninteractive-tabindex
      tabIndex={0}
      onKeyDown={onKeyDown}
      onPointerDown={onPointerDown}
      onPointerMove={onPointerMove}
      onPointerUp={release}
      onPointerCancel={release}
    />
  );
}
