'use client';

export function TitleBar(_props: { id: string; revision: number }) {
  return null;
}
