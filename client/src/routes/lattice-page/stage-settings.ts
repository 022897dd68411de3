import { useCallback, useState } from 'react';
import { z } from 'zod';

const stored = z.object({ ionScale: z.number().min(0.2).max(1), signMarks: z.boolean() });
type StageSettings = z.infer<typeof stored>;

const storageKey = 'holdfast.stage';
const usual: StageSettings = { ionScale: 0.55, signMarks: false };

function read(): StageSettings {
  try {
    return stored.parse(JSON.parse(localStorage.getItem(storageKey) ?? 'null'));
  } catch {
    // Nothing kept, or not readable: the usual settings.
    return usual;
  }
}

/** How ions are drawn; a habit of the person, so kept on the device and not in the address. */
export function useStageSettings(): [StageSettings, (change: Partial<StageSettings>) => void] {
  const [settings, setSettings] = useState(read);
  const change = useCallback((part: Partial<StageSettings>) => {
    setSettings((old) => {
      const next = { ...old, ...part };
      try {
        localStorage.setItem(storageKey, JSON.stringify(next));
      } catch {
        // Not kept where storage is blocked; it holds until the page closes.
      }
      return next;
    });
  }, []);
  return [settings, change];
}
