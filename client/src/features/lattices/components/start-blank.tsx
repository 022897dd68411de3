import type { JSX } from 'react';

import type { CellDefinition } from '#common/schemas/cell';
import { CreateForm } from '#client/features/lattices/components/create-form.tsx';

const blankCell: CellDefinition = {
  lattice: { a: '5', b: '5', c: '5', alpha: '90', beta: '90', gamma: '90' },
  symmetry: { kind: 'setting', hallNumber: 1 },
  parameters: [],
  sites: [],
};

/** An empty cell without symmetry, to be filled by hand. */
export function StartBlank(): JSX.Element {
  return (
    <div className="grid max-w-xl gap-4">
      <p className="text-soft">
        A cell without symmetry and without sites. Its edges, space group and sites are typed in on
        the next page.
      </p>
      <CreateForm
        suggestedName="Untitled lattice"
        cell={blankCell}
        prototype={null}
        warnings={[]}
        guess={null}
        preview={null}
      />
    </div>
  );
}
