import type { CaseFile, Quantity } from './schema';

/** Where a value must lie: the physical support of a quantity. Bounds are SI (angles in degrees). */
export interface Support {
  low: number;
  high: number;
  /** Whether the bound itself is allowed. */
  lowOpen: boolean;
}

const ANY: Support = { low: -Infinity, high: Infinity, lowOpen: false };
const POSITIVE: Support = { low: 0, high: Infinity, lowOpen: true };
const NON_NEGATIVE: Support = { low: 0, high: Infinity, lowOpen: false };
const SHARE: Support = { low: 0, high: 1, lowOpen: false };

const BY_LAST_KEY: Record<string, Support> = {
  mass: POSITIVE,
  yawInertia: POSITIVE,
  frontAxleToMassCentre: POSITIVE,
  friction: POSITIVE,
  width: POSITIVE,
  a: POSITIVE,
  b: POSITIVE,
  pulse: POSITIVE,
  distance: NON_NEGATIVE,
  endSpeed: NON_NEGATIVE,
  speed: NON_NEGATIVE,
  slide: NON_NEGATIVE,
  onset: NON_NEGATIVE,
  share: SHARE,
  braking: SHARE,
  restitution: SHARE,
};

/** The support of the quantity at a dotted path: draws are kept inside it. */
export function supportOf(path: string): Support {
  if (path === 'impact.friction') return NON_NEGATIVE;
  if (/^damage\.[AB]\.depths\.\d+$/.test(path)) return NON_NEGATIVE;
  return BY_LAST_KEY[path.slice(path.lastIndexOf('.') + 1)] ?? ANY;
}

export const isQuantity = (node: unknown): node is Quantity =>
  typeof node === 'object' && node !== null && typeof (node as Quantity).value === 'number';

/** Every quantity that a case states, with its dotted path, in document order. */
export function quantitiesOf(casefile: CaseFile): { path: string; quantity: Quantity }[] {
  const found: { path: string; quantity: Quantity }[] = [];
  const walk = (node: unknown, path: string): void => {
    if (isQuantity(node)) found.push({ path, quantity: node });
    else if (typeof node === 'object' && node !== null)
      for (const [key, child] of Object.entries(node)) walk(child, path === '' ? key : `${path}.${key}`);
  };
  walk(casefile, '');
  return found.filter(({ path }) => !path.startsWith('hypotheses.'));
}

/** The node at a dotted path, or undefined. */
export const nodeAt = (root: unknown, path: string): unknown =>
  path === ''
    ? root
    : path.split('.').reduce<unknown>((node, key) => (node as Record<string, unknown> | null | undefined)?.[key], root);
