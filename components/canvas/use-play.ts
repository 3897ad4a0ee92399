import { useCallback, useEffect, useState } from 'react';
import type { TravelClock } from './travel-clock';

/** Runs the clock of the travel in real time up to its end, from the beginning when it stands there. */
export function usePlay(clock: TravelClock, end: number) {
  const [playing, setPlaying] = useState(false);
  useEffect(() => {
    if (!playing) return;
    const from = clock.getState().time < end ? clock.getState().time : 0;
    let began: number | null = null;
    let frame = requestAnimationFrame(function step(now: number) {
      began ??= now;
      const time = from + (now - began) / 1000;
      clock.setState({ time: Math.min(time, end) });
      if (time >= end) setPlaying(false);
      else frame = requestAnimationFrame(step);
    });
    return () => cancelAnimationFrame(frame);
  }, [clock, end, playing]);

  const toggle = useCallback((): void => setPlaying((now) => !now), []);
  const pause = useCallback((): void => setPlaying(false), []);
  return { playing, toggle, pause };
}
