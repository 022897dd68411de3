import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState, type JSX } from 'react';
import { describe, expect, it } from 'vitest';

import { Segmented } from '#client/components/segmented.tsx';
import { SelectField } from '#client/components/select-field.tsx';
import { stateWord, StateBadge } from '#client/components/state-badge.tsx';
import { TextField } from '#client/components/text-field.tsx';

const options = [
  { value: 'bare', label: 'Bare' },
  { value: 'neutralised', label: 'Neutralised' },
] as const;
type View = (typeof options)[number]['value'];

function Choice({ kind }: { kind: 'list' | 'row' }): JSX.Element {
  const [value, setValue] = useState<View>('bare');
  const Field = kind === 'list' ? SelectField : Segmented;
  return <Field<View> label="View" options={[...options]} value={value} onChange={setValue} />;
}

describe('fields', () => {
  it('ties label, hint and error to the field', () => {
    render(<TextField label="Edge a" suffix="Å" error="Write a length." hint="As 4.212" />);
    const field = screen.getByLabelText('Edge a');
    expect(field).toBeInvalid();
    expect(field).toHaveAccessibleDescription('Write a length. As 4.212');
  });

  it('chooses from a list by keyboard', async () => {
    const user = userEvent.setup();
    render(<Choice kind="list" />);
    await user.click(screen.getByRole('button', { name: 'View: Bare' }));
    await user.keyboard('{ArrowDown}{Enter}');
    expect(screen.getByRole('button', { name: 'View: Neutralised' })).toBeInTheDocument();
  });

  it('chooses in a row by keyboard', async () => {
    const user = userEvent.setup();
    render(<Choice kind="row" />);
    await user.click(screen.getByRole('radio', { name: 'Bare' }));
    await user.keyboard('{ArrowRight}');
    expect(screen.getByRole('radio', { name: 'Neutralised' })).toBeChecked();
  });
});

describe('StateBadge', () => {
  it.each(['draft', 'in_review', 'accepted', 'returned'] as const)(
    'shows %s as a word and a shape',
    (state) => {
      const { container } = render(<StateBadge state={state} />);
      expect(screen.getByText(stateWord(state))).toBeInTheDocument();
      expect(container.querySelector('svg > *')).not.toBeNull();
    },
  );
});
