import type { Section } from './report';
export const planSection = (..._: unknown[]): Section | null => null;
