import { useEffect, useState, type JSX } from 'react';

import { LogoMark } from '#client/components/logo.tsx';

const patienceMs = 250;

/** While the first answer is on its way: nothing at first, then the mark. */
export function Splash(): JSX.Element {
  const [isSlow, setSlow] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setSlow(true), patienceMs);
    return () => clearTimeout(timer);
  }, []);
  return (
    <div role="status" aria-label="Loading" className="grid min-h-dvh place-items-center">
      <title>Holdfast</title>
      {isSlow && <LogoMark className="animate-sheen size-10" />}
    </div>
  );
}
