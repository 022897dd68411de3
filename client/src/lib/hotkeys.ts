import { useEffect, useRef } from 'react';

interface HotkeyOptions {
  /** Also while typing in a field; keys with `mod` always are. */
  whileTyping?: boolean;
  enabled?: boolean;
}

function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || target.closest('input, textarea, select') !== null)
  );
}

/** Whether an event is the combination `mod+shift+z`, `/`, `Escape` …; mod is Ctrl or ⌘. */
export function matchesHotkey(event: KeyboardEvent, combination: string): boolean {
  const parts = combination.split('+');
  const key = parts.pop() ?? '';
  const hasMod = parts.includes('mod');
  const pressedMod = event.ctrlKey || event.metaKey;
  // Single signs such as `?` need Shift on many keyboards: only letters and names mind it.
  const mindsShift = /^[a-z]{1,}$/i.test(key);
  return (
    event.key.toLowerCase() === key.toLowerCase() &&
    pressedMod === hasMod &&
    !event.altKey &&
    (!mindsShift || event.shiftKey === parts.includes('shift'))
  );
}

/** Calls the handler when the combination is pressed anywhere on the page. */
export function useHotkey(
  combination: string,
  handler: (event: KeyboardEvent) => void,
  { whileTyping = false, enabled = true }: HotkeyOptions = {},
): void {
  const latest = useRef(handler);
  useEffect(() => {
    latest.current = handler;
  });
  useEffect(() => {
    if (!enabled) {
      return undefined;
    }
    const listen = (event: KeyboardEvent): void => {
      if (event.defaultPrevented || !matchesHotkey(event, combination)) {
        return;
      }
      if (!whileTyping && !combination.includes('mod+') && isTyping(event.target)) {
        return;
      }
      latest.current(event);
    };
    document.addEventListener('keydown', listen);
    return () => document.removeEventListener('keydown', listen);
  }, [combination, enabled, whileTyping]);
}
