import { fireEvent, render, screen } from '@testing-library/react';
import type { JSX } from 'react';
import { describe, expect, it, vi } from 'vitest';

import { matchesHotkey, useHotkey } from '#client/lib/hotkeys.ts';

const press = (init: KeyboardEventInit): KeyboardEvent => new KeyboardEvent('keydown', init);

function Listener({ keys, onPress }: { keys: string; onPress: () => void }): JSX.Element {
  useHotkey(keys, onPress);
  return <input aria-label="field" />;
}

describe('matchesHotkey', () => {
  it('takes Ctrl and ⌘ alike, and minds Shift for letters', () => {
    expect(matchesHotkey(press({ key: 'z', ctrlKey: true }), 'mod+z')).toBe(true);
    expect(matchesHotkey(press({ key: 'z', metaKey: true }), 'mod+z')).toBe(true);
    expect(matchesHotkey(press({ key: 'Z', ctrlKey: true, shiftKey: true }), 'mod+z')).toBe(false);
    expect(matchesHotkey(press({ key: 'Z', ctrlKey: true, shiftKey: true }), 'mod+shift+z')).toBe(
      true,
    );
  });

  it('takes a sign that needs Shift on some keyboards', () => {
    expect(matchesHotkey(press({ key: '/', shiftKey: true }), '/')).toBe(true);
    expect(matchesHotkey(press({ key: '/', ctrlKey: true }), '/')).toBe(false);
  });
});

describe('useHotkey', () => {
  it('stays out of the way while someone types', () => {
    const onPress = vi.fn();
    render(<Listener keys="/" onPress={onPress} />);
    fireEvent.keyDown(screen.getByLabelText('field'), { key: '/' });
    expect(onPress).not.toHaveBeenCalled();
    fireEvent.keyDown(document.body, { key: '/' });
    expect(onPress).toHaveBeenCalledTimes(1);
  });

  it('listens to commands also while someone types', () => {
    const onPress = vi.fn();
    render(<Listener keys="mod+s" onPress={onPress} />);
    fireEvent.keyDown(screen.getByLabelText('field'), { key: 's', ctrlKey: true });
    expect(onPress).toHaveBeenCalledTimes(1);
  });
});
