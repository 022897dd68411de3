import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { noOverrides } from '#common/chemistry/sourced';
import { defaultEnergeticModel } from '#common/schemas/energetics';
import { ChecksPanel } from '#client/features/checks/components/checks-panel.tsx';
import {
  caesiumChlorideCell,
  caesiumChlorideResult,
} from '#client/testing/energetics-factories.ts';

const common = { model: defaultEnergeticModel, overrides: noOverrides };

describe('the checks of a cell', () => {
  it('tell every check with its word, and say what could not be judged', () => {
    render(
      <ChecksPanel
        {...common}
        cell={caesiumChlorideCell()}
        result={caesiumChlorideResult()}
        problem={null}
      />,
    );
    expect(screen.getAllByRole('heading', { level: 3 })).toHaveLength(12);
    expect(screen.getByText('The charges of the cell add up to zero.')).toBeInTheDocument();
    expect(screen.getByText(/computes no elastic constants/)).toBeInTheDocument();
    expect(screen.getByText(/3 not judged|4 not judged/)).toBeInTheDocument();
    expect(screen.queryByText('Caution')).not.toBeInTheDocument();
  });

  it('fail a cell whose charges don’t balance, without an evaluation', () => {
    render(
      <ChecksPanel
        {...common}
        cell={caesiumChlorideCell(2)}
        result={null}
        problem="The charges do not add up to zero, so the cell has no Madelung energy."
      />,
    );
    expect(screen.getByText('Something is wrong with this cell.')).toBeInTheDocument();
    expect(screen.getByText(/The charges of the cell add up to \+1\.0000 e/)).toBeInTheDocument();
    expect(screen.getByText(/no Madelung energy/)).toBeInTheDocument();
  });
});
