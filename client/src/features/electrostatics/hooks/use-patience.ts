import { useEffect, useState } from 'react';

const patienceMs = 300;

/** True only once something has been pending for a while, so that quick answers never flash. */
export function usePatience(isPending: boolean): boolean {
  const [isLong, setLong] = useState(false);
  useEffect(() => {
    if (!isPending) {
      return undefined;
    }
    const timer = setTimeout(() => setLong(true), patienceMs);
    return () => {
      clearTimeout(timer);
      setLong(false);
    };
  }, [isPending]);
  return isPending && isLong;
}
