import { useCallback, useEffect, useState } from 'react';

interface Countdown {
  /** Whole seconds left; 0 when nothing is waited for. */
  secondsLeft: number;
  start: (seconds: number) => void;
}

/** A wait that counts down by the clock, also while the page was asleep. */
export function useCountdown(): Countdown {
  const [wait, setWait] = useState({ untilMs: 0, nowMs: 0 });
  const secondsLeft = Math.max(0, Math.ceil((wait.untilMs - wait.nowMs) / 1000));
  const isRunning = secondsLeft > 0;
  useEffect(() => {
    if (!isRunning) {
      return undefined;
    }
    const timer = setInterval(() => setWait((one) => ({ ...one, nowMs: Date.now() })), 500);
    return () => clearInterval(timer);
  }, [isRunning]);

  const start = useCallback((seconds: number) => {
    const nowMs = Date.now();
    setWait({ untilMs: nowMs + seconds * 1000, nowMs });
  }, []);
  return { secondsLeft, start };
}
