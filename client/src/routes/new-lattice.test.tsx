import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { sessionState, type Role } from '#common/schemas/auth';
import { draft, latticeSummary, shelfPage } from '#common/schemas/lattice';
import { appliedPrototype, prototypeList } from '#common/schemas/prototype';
import { spaceGroupDetail } from '#common/schemas/symmetry';
import { idOf, latticeOf, sessionOf, shelfOf, userOf } from '#client/testing/factories.ts';
import { answer, fakeApi, refuse, type FakeApi } from '#client/testing/fake-api.ts';
import { cellOf, draftOf, spaceGroupOf } from '#client/testing/lattice-factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

// jsdom has no canvas; the stage has tests of its own.
vi.mock('#client/scene/viewer.tsx', () => ({ LatticeViewer: () => <div>stage</div> }));

const base = '/workspaces/kiln-lane';

function starts(role: Role = 'crystallographer'): FakeApi {
  const lattice = latticeOf({ headRevision: 0, hasDraft: true, state: 'draft' });
  return fakeApi({
    'GET /session': answer(sessionState, sessionOf({ user: userOf(role) })),
    [`GET ${base}/lattices`]: answer(shelfPage, shelfOf([])),
    'GET /space-groups/1': answer(spaceGroupDetail, spaceGroupOf()),
    'GET /prototypes': answer(prototypeList, {
      items: [
        {
          id: 'caesium-chloride',
          name: 'Caesium chloride',
          example: 'CsCl',
          spaceGroupNumber: 221,
          spaceGroupSymbol: 'P m -3 m',
          roles: [
            { element: 'Cs', charge: 1, coordination: 8, perFormulaUnit: 1 },
            { element: 'Cl', charge: -1, coordination: 8, perFormulaUnit: 1 },
          ],
          description: 'Each ion at the centre of a cube of the other.',
        },
      ],
    }),
    'POST /prototypes/caesium-chloride/apply': answer(appliedPrototype, {
      prototype: 'caesium-chloride',
      suggestedName: 'CsCl in caesium chloride',
      cell: cellOf(),
      guess: 'a = 2 (r₊ + r₋)/√3 from ionic radii for 8 neighbours.',
      warnings: [],
    }),
    [`POST ${base}/lattices`]: answer(latticeSummary, lattice),
    [`GET ${base}/lattices/${idOf(100)}`]: answer(latticeSummary, lattice),
    [`GET ${base}/lattices/${idOf(100)}/draft`]: answer(draft, draftOf({ baseRevision: 0 })),
  });
}

describe('a new lattice', () => {
  it('starts from a structure type with its ions and a labelled guess', async () => {
    const api = starts();
    const { user, address } = renderAt('/w/kiln-lane/new');
    await user.click(await screen.findByRole('radio', { name: /Caesium chloride/ }));
    expect(await screen.findByText('A guess to start from.', { exact: false })).toBeInTheDocument();
    const name = await screen.findByLabelText('Name');
    expect(name).toHaveValue('CsCl in caesium chloride');
    await user.clear(name);
    await user.type(name, 'Warm salt');
    await user.click(screen.getByRole('button', { name: 'Create the lattice' }));
    await waitFor(() => expect(address()).toBe(`/w/kiln-lane/lattices/${idOf(100)}?section=cell`));
    expect(api.last(`POST ${base}/lattices`)?.body).toMatchObject({
      name: 'Warm salt',
      prototype: 'caesium-chloride',
    });
  });

  it('asks for the ions chosen', async () => {
    const api = starts();
    const { user } = renderAt('/w/kiln-lane/new?type=caesium-chloride');
    const element = await screen.findByRole('combobox', { name: 'Element in place of Cs' });
    await user.click(element);
    await user.keyboard('rubid');
    await user.click(await screen.findByRole('option', { name: /Rubidium/i }));
    await waitFor(() =>
      expect(api.last('POST /prototypes/caesium-chloride/apply')?.body).toMatchObject({
        ions: [{ element: 'Rb', charge: 1 }, { element: 'Cl' }],
      }),
    );
  });

  it('shows the line a CIF fails at', async () => {
    const api = starts();
    api.on({ 'POST /cif/read': refuse('cif.bad_value', { line: 2 }) });
    const { user } = renderAt('/w/kiln-lane/new?from=cif');
    await user.type(
      await screen.findByLabelText('Or paste its text'),
      'data_x{Enter}_cell_length_a four',
    );
    await user.click(screen.getByRole('button', { name: 'Read it' }));
    const alert = await screen.findByRole('alert');
    expect(alert).toHaveTextContent('line 2');
    expect(alert).toHaveTextContent('_cell_length_a four');
  });

  it('needs a name', async () => {
    const api = starts();
    const { user } = renderAt('/w/kiln-lane/new?from=blank');
    await user.clear(await screen.findByLabelText('Name'));
    await user.click(screen.getByRole('button', { name: 'Create the lattice' }));
    expect(await screen.findByText('Give the lattice a name.')).toBeInTheDocument();
    expect(api.last(`POST ${base}/lattices`)).toBeUndefined();
  });

  it('is not for readers', async () => {
    starts('reader');
    renderAt('/w/kiln-lane/new');
    expect(await screen.findByText('Your role does not create lattices')).toBeInTheDocument();
  });
});
