import { type CaseFile, type Quantity, type VehicleId, VEHICLE_IDS } from '@/lib/casefile/schema';
import { recorderUncertainty } from '@/lib/mechanics/recorder';
import { standardUncertainty } from '@/lib/numerics/spread';

/** A recorded component of delta-V. */
export interface RecordedGiven {
  id: VehicleId;
  key: 'forward' | 'left';
  path: string;
  quantity: Quantity;
  /** «the recorded forward delta-V of A». */
  name: string;
}

const WORDS = { forward: 'forward delta-V', left: 'delta-V to the left' };

export const recordedGiven = (casefile: CaseFile): RecordedGiven[] =>
  VEHICLE_IDS.flatMap((id) =>
    (['forward', 'left'] as const).flatMap((key) => {
      const quantity = casefile.recorded?.[id]?.[key];
      return quantity
        ? [{ id, key, path: `recorded.${id}.${key}`, quantity, name: `the recorded ${WORDS[key]} of ${id}` }]
        : [];
    }),
  );

/** Stated standard uncertainty, m/s; that of the regulation where no spread is stated. */
export const uncertaintyOf = ({ value, spread }: Quantity): number =>
  spread ? standardUncertainty(value, spread) : recorderUncertainty(value);
