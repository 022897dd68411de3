import { useEffect, useMemo } from 'react';

/** Keeps a three object for as long as its maker's inputs are the same, then frees it. */
export function useDisposable<Thing extends { dispose: () => void }>(make: () => Thing): Thing {
  const thing = useMemo(() => make(), [make]);
  useEffect(() => () => thing.dispose(), [thing]);
  return thing;
}
