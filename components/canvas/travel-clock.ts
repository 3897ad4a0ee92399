import { useStore } from 'zustand';
import { type StoreApi, createStore } from 'zustand/vanilla';

/** The moment of the simulated travel that the board shows, s from first contact: one for both vehicles. */
export type TravelClock = StoreApi<{ time: number }>;

export const createTravelClock = (): TravelClock => createStore(() => ({ time: 0 }));

/** The moment shown; never beyond the end, which may have come nearer since it was chosen. */
export const useTravelTime = (clock: TravelClock, end: number): number =>
  Math.min(
    end,
    useStore(clock, ({ time }) => time),
  );
