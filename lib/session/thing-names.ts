import type { ThingId } from '@/lib/casefile/fields';
import { wheelWords } from '@/lib/casefile/wheels';

/** A thing of the board in words, as they stand inside a sentence. */
export function nameOf(thing: ThingId): string {
  const [kind, which = '', k = ''] = thing.split('.');
  switch (kind) {
    case 'vehicle':
      return which;
    case 'contact':
      return `the contact ${which}`;
    case 'approach':
      return `the approach of ${which}`;
    case 'leg':
      return `leg ${Number(k) + 1} of ${which}`;
    case 'rest':
      return `the rest pose of ${which}`;
    case 'wheel':
      return `the ${wheelWords(k)} wheel of ${which}`;
    case 'surface':
      return `surface ${Number(which) + 1}`;
    case 'mark':
      return `mark ${Number(which) + 1}`;
    default:
      return `the travel of ${which}`;
  }
}
