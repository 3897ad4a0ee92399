'use client';

export function Ledger() {
  return null;
}
