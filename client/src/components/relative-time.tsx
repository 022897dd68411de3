import { useEffect, useState, type JSX } from 'react';

import { formatAge, formatExact } from '#client/lib/relative-age.ts';

const tickMs = 60_000;

/** How long ago (or until) something is; the exact moment on hover, in the reader's zone. */
export function RelativeTime({ at }: { at: string }): JSX.Element {
  const [nowMs, setNowMs] = useState(() => Date.now());
  useEffect(() => {
    const timer = setInterval(() => setNowMs(Date.now()), tickMs);
    return () => clearInterval(timer);
  }, []);
  return (
    <time dateTime={at} title={formatExact(at)} className="whitespace-nowrap">
      {formatAge(at, nowMs)}
    </time>
  );
}
