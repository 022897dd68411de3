import { fireEvent, render, screen } from '@testing-library/react';
import { useState, type JSX } from 'react';
import { beforeEach, describe, expect, it, vi } from 'vitest';

import { periclase, periclaseRadiusA } from './model/test-cells.ts';
import type { Repeat } from './model/block.ts';
import type { LatticeViewerProps } from './viewer-props.ts';
import { LatticeViewer } from './viewer.tsx';

const describeIon = (id: string): { title: string; detail: string } => ({
  title: periclase.sites[Number(id.split('.')[0])]!.label,
  detail: id,
});

function Bench(props: Partial<LatticeViewerProps>): JSX.Element {
  const [selected, setSelected] = useState<readonly string[]>([]);
  const [repeat, setRepeat] = useState<Repeat>([1, 1, 1]);
  return (
    <LatticeViewer
      cell={periclase}
      ionicRadiusA={periclaseRadiusA}
      selectedIonIds={selected}
      onSelectionChange={setSelected}
      litPair={null}
      pins={[]}
      repeat={repeat}
      onRepeatChange={setRepeat}
      ionScale={0.55}
      signMarks={false}
      view={null}
      describeIon={describeIon}
      theme="light"
      {...props}
    />
  );
}

const stage = (): HTMLElement => screen.getByRole('application');
const spoken = (): string => screen.getByRole('status').textContent;

describe('LatticeViewer', () => {
  beforeEach(() => {
    // This person wants no motion: views change at once.
    vi.stubGlobal('matchMedia', (media: string) => ({
      matches: media.includes('reduce'),
      media,
      addEventListener: () => undefined,
      removeEventListener: () => undefined,
    }));
  });

  it('is one focusable element that says what it shows and falls back to the processor', () => {
    render(<Bench />);
    expect(stage()).toHaveAttribute('tabindex', '0');
    expect(stage()).toHaveAccessibleName(/27 ions/);
    expect(stage()).toHaveAccessibleDescription(/Arrow keys walk/);
    expect(stage()).toHaveAttribute('data-renderer', 'cpu');
    expect(spoken()).toBe('No ion selected');
  });

  it('walks by arrow keys, adds with Ctrl and clears with Escape', () => {
    render(<Bench />);
    fireEvent.keyDown(stage(), { key: 'ArrowDown' });
    expect(spoken()).toMatch(/^Selected: O1/);
    fireEvent.keyDown(stage(), { key: 'ArrowDown' });
    expect(spoken()).toMatch(/^Selected: Mg1/);
    fireEvent.keyDown(stage(), { key: 'ArrowDown', ctrlKey: true });
    expect(spoken()).toMatch(/^Selected: Mg1.*; O1/);
    fireEvent.keyDown(stage(), { key: 'Escape' });
    expect(spoken()).toBe('No ion selected');
  });

  it('reports a view only after it has been moved', () => {
    vi.useFakeTimers();
    const onViewChange = vi.fn();
    render(<Bench onViewChange={onViewChange} />);
    vi.advanceTimersByTime(1000);
    expect(onViewChange).not.toHaveBeenCalled();
    fireEvent.keyDown(stage(), { key: '+' });
    vi.advanceTimersByTime(1000);
    expect(onViewChange).toHaveBeenCalledTimes(1);
    expect(onViewChange).toHaveBeenCalledWith(expect.objectContaining({ zoom: 1.2 }));
    vi.useRealTimers();
  });

  it('reports to the newest handler, also when it changes while the view settles', () => {
    vi.useFakeTimers();
    const [early, late] = [vi.fn(), vi.fn()];
    const { rerender } = render(<Bench onViewChange={early} />);
    fireEvent.keyDown(stage(), { key: '-' });
    rerender(<Bench onViewChange={late} />);
    vi.advanceTimersByTime(1000);
    expect(early).not.toHaveBeenCalled();
    expect(late).toHaveBeenCalledTimes(1);
    vi.useRealTimers();
  });

  it('looks along an axis by key, shown in the row of directions', () => {
    render(<Bench />);
    expect(screen.getByRole('radio', { name: 'free' })).toBeChecked();
    fireEvent.keyDown(stage(), { key: 'b' });
    expect(screen.getByRole('radio', { name: 'b' })).toBeChecked();
  });

  it('repeats the cell from the row below', () => {
    render(<Bench />);
    fireEvent.change(screen.getByRole('combobox', { name: 'Cells along c' }), {
      target: { value: '2' },
    });
    expect(stage()).toHaveAccessibleName(/45 ions/);
  });

  it('offers remarks as buttons with their text', () => {
    const onPinClick = vi.fn();
    const pin = { id: 'r1', number: 1, siteLabel: 'Mg1', pair: null, isResolved: false };
    render(<Bench pins={[{ ...pin, summary: 'Too short?' }]} onPinClick={onPinClick} />);
    fireEvent.click(screen.getByRole('button', { name: 'Remark 1: Too short?' }));
    expect(onPinClick).toHaveBeenCalledWith('r1');
  });

  it('leaves out controls that nobody listens to', () => {
    render(<Bench />);
    expect(screen.queryByRole('slider')).toBeNull();
    expect(screen.queryByRole('checkbox')).toBeNull();
  });

  it('passes over selected ions that are not on show', () => {
    render(<Bench selectedIonIds={['0.7.7.7']} />);
    expect(stage().querySelectorAll('svg g circle[stroke-width="2.25"]')).toHaveLength(0);
  });
});
