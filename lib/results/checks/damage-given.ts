import { type CaseFile, type Damage, type VehicleId, VEHICLE_IDS } from '@/lib/casefile/schema';

/** Damage that a case states: by vehicle, with whether any depth remained. */
export interface DamageGiven {
  id: VehicleId;
  damage: Damage;
  crushed: boolean;
}

export const damageGiven = (casefile: CaseFile): DamageGiven[] =>
  VEHICLE_IDS.flatMap((id) => {
    const damage = casefile.damage?.[id];
    return damage ? [{ id, damage, crushed: damage.depths.some(({ value }) => value > 0) }] : [];
  });

/** Mean depth over the damaged width, m, the depth running straight from station to station. */
export function meanDepth({ depths, stations, width }: Damage): number {
  const n = depths.length - 1;
  const at = (i: number): number => (stations ? stations[i] / width.value : i / n);
  return depths
    .slice(1)
    .reduce((sum, depth, i) => sum + ((at(i + 1) - at(i)) * (depth.value + depths[i].value)) / 2, 0);
}

/** The most that a vehicle without any depth can have taken along the normal, J: A^2 / (2 B) per width. */
export const mostWithoutDepth = ({ a, b, width }: Damage): number =>
  ((a.value * a.value) / (2 * b.value)) * width.value;

/** «A», «A and B». */
export const idsOf = (given: readonly { id: VehicleId }[]): string => given.map(({ id }) => id).join(' and ');
