import { act, render, screen } from '@testing-library/react';
import type { JSX } from 'react';
import { afterEach, describe, expect, it } from 'vitest';

import { setThemePreference, useTheme, useThemePreference } from '#client/lib/theme.ts';

function Shown(): JSX.Element {
  return (
    <p>
      {useThemePreference()} is {useTheme()}
    </p>
  );
}

afterEach(() => setThemePreference('system'));

describe('theme', () => {
  it('follows the system until someone chooses, and remembers the choice', () => {
    render(<Shown />);
    expect(screen.getByText('system is light')).toBeInTheDocument();
    act(() => setThemePreference('dark'));
    expect(screen.getByText('dark is dark')).toBeInTheDocument();
    expect(document.documentElement).toHaveClass('dark');
    expect(localStorage.getItem('holdfast.theme')).toBe('dark');
    act(() => setThemePreference('system'));
    expect(document.documentElement).not.toHaveClass('dark');
    expect(localStorage.getItem('holdfast.theme')).toBeNull();
  });
});
