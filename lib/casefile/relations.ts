import type { Issue } from './issue';
import { isQuantity, nodeAt, supportOf } from './quantities';

/**
 * What must hold between the keys of a case. Works on a document that may fail the schema elsewhere, so that every
 * problem is reported at once; looks only at what has the right type.
 */
export function relationIssues(document: unknown): Issue[] {
  return [
    ...spreadIssues(document),
    ...vehicleIssues(document),
    ...damageIssues(document),
    ...hypothesisIssues(document),
  ];
}

interface Limits {
  value: number;
  low: number;
  high: number;
}

function limitIssues(path: string, { value, low, high }: Limits): Issue[] {
  if (!(low < high)) return [{ path: `${path}.spread`, says: `low (${low}) must be less than high (${high})` }];
  const issues: Issue[] = [];
  if (value < low || value > high)
    issues.push({ path: `${path}.value`, says: `must lie between low (${low}) and high (${high}), found ${value}` });
  const support = supportOf(path);
  if (low < support.low || (support.lowOpen && low <= support.low))
    issues.push({
      path: `${path}.spread.low`,
      says: `must be ${support.lowOpen ? 'greater than' : 'at least'} ${support.low}`,
    });
  if (high > support.high) issues.push({ path: `${path}.spread.high`, says: `must be at most ${support.high}` });
  return issues;
}

function spreadIssues(document: unknown): Issue[] {
  const issues: Issue[] = [];
  const walk = (node: unknown, path: string): void => {
    if (typeof node !== 'object' || node === null) return;
    if (isQuantity(node)) {
      const spread = node.spread as { low?: unknown; high?: unknown } | null | undefined;
      const { low, high } = spread ?? {};
      if (typeof low === 'number' && typeof high === 'number')
        issues.push(...limitIssues(path, { value: node.value, low, high }));
      return;
    }
    for (const [key, child] of Object.entries(node)) walk(child, path === '' ? key : `${path}.${key}`);
  };
  walk(document, '');
  return issues;
}

const numberAt = (document: unknown, path: string): number => {
  const node = nodeAt(document, path);
  return typeof node === 'number' ? node : NaN;
};

function vehicleIssues(document: unknown): Issue[] {
  return ['A', 'B'].flatMap((id) => {
    const at = `vehicles.${id}`;
    const wheelbase = numberAt(document, `${at}.wheelbase`);
    const length = numberAt(document, `${at}.length`);
    const massCentre = numberAt(document, `${at}.frontAxleToMassCentre.value`);
    const issues: Issue[] = [];
    if (wheelbase >= length)
      issues.push({ path: `${at}.wheelbase`, says: `must be less than the length (${length}), found ${wheelbase}` });
    if (massCentre >= wheelbase)
      issues.push({
        path: `${at}.frontAxleToMassCentre.value`,
        says: `must be less than the wheelbase (${wheelbase}), found ${massCentre}`,
      });
    const high = numberAt(document, `${at}.frontAxleToMassCentre.spread.high`);
    if (high >= wheelbase)
      issues.push({
        path: `${at}.frontAxleToMassCentre.spread.high`,
        says: `must be less than the wheelbase (${wheelbase}), found ${high}`,
      });
    return issues;
  });
}

function damageIssues(document: unknown): Issue[] {
  return ['A', 'B'].flatMap((id) => {
    const at = `damage.${id}`;
    const depths = nodeAt(document, `${at}.depths`);
    const stations = nodeAt(document, `${at}.stations`);
    const width = numberAt(document, `${at}.width.value`);
    if (!Array.isArray(stations) || !stations.every((s) => typeof s === 'number')) return [];
    const path = `${at}.stations`;
    if (Array.isArray(depths) && depths.length !== stations.length)
      return [{ path, says: `must have one entry for each depth (${depths.length}), found ${stations.length}` }];
    if (stations.some((s, i) => i > 0 && !(s > stations[i - 1])))
      return [{ path, says: 'must increase from entry to entry' }];
    if (stations[0] !== 0 || Math.abs(stations[stations.length - 1] - width) > 1e-9)
      return [{ path, says: `must run from 0 to the width (${width})` }];
    return [];
  });
}

/** The paths that a hypothesis may set: a quantity, or a whole departure. */
const SETTABLE = [
  /^vehicles\.[AB]\.(frontAxleToMassCentre|mass|yawInertia)$/,
  /^impact\.[AB]\.(x|y|heading)$/,
  /^impact\.point\.(x|y)$/,
  /^impact\.(plane|restitution|impulseRatio|friction|slide)$/,
  /^approach\.[AB]\.(direction|speed|yawRate|slip)$/,
  /^departure\.[AB]$/,
  /^departure\.[AB]\.(direction|yawRate|endSpeed|friction|onset)$/,
  /^departure\.[AB]\.legs\.\d+\.(distance|friction|share|grade)$/,
  /^departure\.[AB]\.rest\.(x|y|heading)$/,
  /^departure\.[AB]\.slope\.(grade|uphill)$/,
  /^departure\.[AB]\.wheels\.(frontLeft|frontRight|rearLeft|rearRight)\.(braking|steer)$/,
  /^departure\.[AB]\.wheels\.all\.braking$/,
  /^damage\.[AB]\.(width|forceAngle|a|b|depths\.\d+)$/,
  /^recorded\.[AB]\.(forward|left)$/,
  /^restOffset\.(x|y|heading)$/,
  /^scene\.surfaces\.\d+\.friction$/,
  /^pulse$/,
];

function hypothesisIssues(document: unknown): Issue[] {
  const hypotheses = nodeAt(document, 'hypotheses');
  if (!Array.isArray(hypotheses)) return [];
  return hypotheses.flatMap((hypothesis, index) =>
    Object.entries((nodeAt(hypothesis, 'set') as Record<string, unknown>) ?? {}).flatMap(([path, value]): Issue[] => {
      const at = `hypotheses.${index}.set.${path}`;
      if (!SETTABLE.some((pattern) => pattern.test(path)))
        return [{ path: at, says: 'is no path of a quantity or a departure' }];
      const wantsDeparture = /^departure\.[AB]$/.test(path);
      if (value !== null && wantsDeparture === isQuantity(value))
        return [{ path: at, says: wantsDeparture ? 'must be a departure or null' : 'must be a quantity or null' }];
      if (!isQuantity(value)) return [];
      const support = supportOf(path);
      const outside =
        value.value < support.low || value.value > support.high || (support.lowOpen && value.value === support.low);
      return outside ? [{ path: `${at}.value`, says: `must lie within ${support.low} and ${support.high}` }] : [];
    }),
  );
}
