'use client';

export function AnswerPanel() {
  return null;
}
