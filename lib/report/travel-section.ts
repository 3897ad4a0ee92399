import type { CaseFile } from '@/lib/casefile/schema';
import type { Travels } from '@/lib/geometry/timed-path';
import type { Section } from './report';
import { travelTable } from './travel-table';

/** The simulated travel of the central values in figures; none where no travel is simulated. */
export const travelSection = (casefile: CaseFile, travels: Travels): Section | null =>
  travels.A || travels.B ? { id: 'travel', title: 'Simulated travel', blocks: [travelTable(casefile, travels)] } : null;
