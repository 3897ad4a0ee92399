'use client';
import { useRef } from 'react';

/** A button that lets the user choose a case file. */
export function FileButton({
  className,
  onFile,
  children,
}: {
  className: string;
  onFile: (file: File) => void;
  children: string;
}) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <>
      <button type="button" className={className} onClick={() => input.current?.click()}>
        {children}
      </button>
      <input
        ref={input}
        type="file"
        accept=".json,application/json"
        aria-label="Case file"
        tabIndex={-1}
        hidden
        onChange={(event) => {
          const file = event.target.files?.[0];
          event.target.value = '';
          if (file) onFile(file);
        }}
      />
    </>
  );
}
