import type { Result } from '@/lib/results/result';

/** Why the headline is withheld: what every failed check says. Empty when none failed. */
export const failuresOf = (result: Result): string[] =>
  result.checks.filter((check) => check.level === 'fail').map((check) => check.says);
