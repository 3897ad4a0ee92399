'use client';
import { type KeyboardEvent, useState } from 'react';

interface Props {
  label: string;
  className: string;
  value: string;
  onChange: (to: string) => void;
  /** Whether an empty text is put back to what it was. */
  needed?: boolean;
}

/** A text that is edited where it stands: Enter or leaving keeps it, Escape puts it back. */
export function TextInPlace({ label, className, value, onChange, needed = false }: Props) {
  const [typed, setTyped] = useState<string | null>(null);

  const keep = (): void => {
    const text = (typed ?? value).trim();
    setTyped(null);
    if (text !== value && !(needed && text === '')) onChange(text);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>): void => {
    if (event.key === 'Enter') keep();
    if (event.key === 'Escape' && typed !== null) {
      event.stopPropagation();
      setTyped(null);
    }
  };
  return (
    <input
      className={className}
      aria-label={label}
      placeholder={label}
      title={typed ?? value}
      value={typed ?? value}
      onChange={(event) => setTyped(event.target.value)}
      onBlur={keep}
      onKeyDown={onKeyDown}
    />
  );
}
