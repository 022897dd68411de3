import { useSyncExternalStore } from 'react';

export type Theme = 'light' | 'dark';
export type ThemePreference = Theme | 'system';

/** Also read by public/theme.js, before the first paint. */
const storageKey = 'holdfast.theme';
const darkQuery = '(prefers-color-scheme: dark)';
const listeners = new Set<() => void>();

function readPreference(): ThemePreference {
  try {
    const stored = localStorage.getItem(storageKey);
    return stored === 'light' || stored === 'dark' ? stored : 'system';
  } catch {
    // Storage may be blocked; the system's preference then decides.
    return 'system';
  }
}

let preference = readPreference();

function currentTheme(): Theme {
  if (preference !== 'system') {
    return preference;
  }
  return matchMedia(darkQuery).matches ? 'dark' : 'light';
}

function apply(): void {
  const theme = currentTheme();
  document.documentElement.classList.toggle('dark', theme === 'dark');
  document
    .querySelector('meta[name="theme-color"]')
    ?.setAttribute('content', theme === 'dark' ? '#101817' : '#F7F5F0');
  for (const listener of listeners) {
    listener();
  }
}

function subscribe(listener: () => void): () => void {
  const media = matchMedia(darkQuery);
  listeners.add(listener);
  media.addEventListener('change', apply);
  return () => {
    listeners.delete(listener);
    media.removeEventListener('change', apply);
  };
}

/** Sets light, dark or whatever the system asks for, and remembers it on this device. */
export function setThemePreference(next: ThemePreference): void {
  preference = next;
  try {
    if (next === 'system') {
      localStorage.removeItem(storageKey);
    } else {
      localStorage.setItem(storageKey, next);
    }
  } catch {
    // Not remembered where storage is blocked; it still holds until the page closes.
  }
  apply();
}

/** The theme that is shown. */
export function useTheme(): Theme {
  return useSyncExternalStore(subscribe, currentTheme);
}

/** What the person chose. */
export function useThemePreference(): ThemePreference {
  return useSyncExternalStore(subscribe, () => preference);
}
