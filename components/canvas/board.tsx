'use client';

export function Board() {
  return null;
}
