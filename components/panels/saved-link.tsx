'use client';
import type { MouseEvent, ReactNode } from 'react';

interface Props {
  href: string;
  className: string;
  save: () => Promise<void>;
  children: ReactNode;
}

/** A link to what the server shows of the open case: it is saved first, so that the other page does not show what it was. */
export function SavedLink({ href, className, save, children }: Props) {
  const follow = (event: MouseEvent<HTMLAnchorElement>): void => {
    const elsewhere = event.button !== 0 || event.metaKey || event.ctrlKey || event.shiftKey || event.altKey;
    if (elsewhere) return void save();
    event.preventDefault();
    void save().then(() => location.assign(href));
  };
  return (
    <a className={className} href={href} onClick={follow}>
      {children}
    </a>
  );
}
