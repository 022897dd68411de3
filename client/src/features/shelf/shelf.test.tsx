import { screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';

import { sessionState, type Role } from '#common/schemas/auth';
import { latticeSummary, shelfPage } from '#common/schemas/lattice';
import { done } from '#common/schemas/shared';
import { answer, fakeApi, refuse, type FakeApi } from '#client/testing/fake-api.ts';
import { idOf, latticeOf, sessionOf, shelfOf, userOf } from '#client/testing/factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

const lattices = '/workspaces/kiln-lane/lattices';
const magnesia = latticeOf({ tags: ['separator'], openRemarks: 2 });
const broken = latticeOf({
  id: idOf(101),
  name: 'Broken on purpose',
  formula: 'Mg2O',
  prototype: null,
  state: 'draft',
  headRevision: 0,
  madelungReduced: null,
  energyEvPerFormulaUnit: null,
  problemCode: 'cell.not_neutral',
});

function shelfWith(items = [magnesia, broken], role: Role = 'owner'): FakeApi {
  return fakeApi({
    'GET /session': answer(sessionState, sessionOf({ user: userOf(role) })),
    [`GET ${lattices}`]: answer(shelfPage, shelfOf(items)),
  });
}

/** The shelf's own request, not the count in the top bar. */
const lastAsked = (api: FakeApi) =>
  api.requests.findLast(({ path, query }) => path === lattices && query['pageSize'] === '50')
    ?.query;

/** A number as shown, without the thin spaces that group its digits. */
const digits = (element: HTMLElement): string => element.textContent.replaceAll(/\s/g, '');

beforeEach(() => {
  vi.useRealTimers();
});

describe('the shelf', () => {
  it('shows each lattice with digits only as far as they are certain', async () => {
    shelfWith();
    renderAt('/w/kiln-lane');
    const row = (await screen.findByRole('link', { name: 'Periclase, trial 3' })).closest('tr');
    const cells = within(row!);
    expect(row).toHaveTextContent('MgO');
    expect(row).toHaveTextContent('rock salt');
    // Bound 4e-10 eV and k_e's 1.6e-10 relative: seven decimals are certain, no more.
    expect(digits(cells.getByTitle(/^certain to ± .* eV$/))).toBe('−47.7954617');
    expect(digits(cells.getByTitle('certain to ± 4 × 10⁻¹²'))).toBe('1.7475645946');
    expect(cells.getByText('In review')).toBeInTheDocument();
    expect(cells.getByText('2 remarks')).toBeInTheDocument();
    expect(cells.getByText('separator')).toBeInTheDocument();
  });

  it('says why a lattice has no energy', async () => {
    shelfWith();
    renderAt('/w/kiln-lane');
    expect(await screen.findByText('charges don’t balance')).toBeInTheDocument();
  });

  it('keeps search, state, order and page in the address and asks for them', async () => {
    const api = shelfWith();
    renderAt('/w/kiln-lane?search=Mg&state=in_review&sort=energy&order=asc&page=3');
    await screen.findByRole('table');
    expect(lastAsked(api)).toEqual({
      search: 'Mg',
      state: 'in_review',
      sort: 'energy',
      order: 'asc',
      page: '3',
      pageSize: '50',
    });
    expect(screen.getByRole('radio', { name: 'In review' })).toBeChecked();
    expect(screen.getAllByRole('searchbox')[0]).toHaveValue('Mg');
  });

  it('sorts by a header, and says which way to screen readers', async () => {
    const api = shelfWith();
    const { user, address } = renderAt('/w/kiln-lane');
    await user.click(await screen.findByRole('button', { name: 'Name' }));
    await waitFor(() => expect(address()).toBe('/w/kiln-lane?sort=name&order=asc'));
    expect(screen.getByRole('columnheader', { name: 'Name' })).toHaveAttribute(
      'aria-sort',
      'ascending',
    );
    await user.click(screen.getByRole('button', { name: 'Name' }));
    await waitFor(() => expect(lastAsked(api)).toMatchObject({ sort: 'name', order: 'desc' }));
    await user.click(screen.getByRole('button', { name: 'Changed' }));
    await waitFor(() => expect(address()).toBe('/w/kiln-lane'));
  });

  it('filters by state and starts again at page one', async () => {
    shelfWith();
    const { user, address } = renderAt('/w/kiln-lane?page=2');
    await user.click(await screen.findByRole('radio', { name: 'Returned' }));
    await waitFor(() => expect(address()).toBe('/w/kiln-lane?state=returned'));
  });

  it('searches while one types', async () => {
    const api = shelfWith();
    const { user, address } = renderAt('/w/kiln-lane');
    await screen.findByRole('table');
    await user.type(screen.getAllByRole('searchbox')[0]!, 'spinel');
    await waitFor(() => expect(address()).toBe('/w/kiln-lane?search=spinel'));
    await waitFor(() => expect(lastAsked(api)).toMatchObject({ search: 'spinel' }));
  });

  it('opens a lattice when its row is clicked, but not when its menu is', async () => {
    shelfWith();
    const { user, address } = renderAt('/w/kiln-lane');
    await user.click(await screen.findByRole('button', { name: /What to do with Periclase/ }));
    expect(address()).toBe('/w/kiln-lane');
    await user.keyboard('{Escape}');
    await user.click(screen.getByText('rock salt'));
    await waitFor(() => expect(address()).toBe(`/w/kiln-lane/lattices/${magnesia.id}`));
  });

  it('pages through a long shelf', async () => {
    const api = shelfWith();
    api.on({
      [`GET ${lattices}`]: answer(shelfPage, shelfOf([magnesia], { total: 120, page: 2 })),
    });
    renderAt('/w/kiln-lane?page=2');
    expect(await screen.findByText('51–100 of 120')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Next page' })).toHaveAttribute(
      'href',
      '/w/kiln-lane?page=3',
    );
  });
});

describe('tidying the shelf', () => {
  it('deletes with a way back', async () => {
    const api = shelfWith();
    api.on({
      [`DELETE ${lattices}/${magnesia.id}`]: answer(done, { ok: true }),
      [`POST ${lattices}/${magnesia.id}/restore`]: answer(latticeSummary, magnesia),
    });
    const { user } = renderAt('/w/kiln-lane');
    await user.click(await screen.findByRole('button', { name: /What to do with Periclase/ }));
    await user.click(screen.getByRole('menuitem', { name: 'Delete' }));
    expect(await screen.findByText('“Periclase, trial 3” is deleted')).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'Undo' }));
    expect(
      await screen.findByText('“Periclase, trial 3” is back on the shelf'),
    ).toBeInTheDocument();
    expect(api.last(`POST ${lattices}/${magnesia.id}/restore`)).toBeDefined();
  });

  it('renames, and shows the server’s objection at the field', async () => {
    const api = shelfWith();
    const route = `PATCH ${lattices}/${magnesia.id}`;
    const fields = [{ code: 'too_big', field: 'name', message: 'That name is too long.' }];
    api.on({ [route]: refuse('request.invalid', { fields }) });
    const { user } = renderAt('/w/kiln-lane');
    await user.click(await screen.findByRole('button', { name: /What to do with Periclase/ }));
    await user.click(screen.getByRole('menuitem', { name: /Rename/ }));
    const field = await screen.findByLabelText('Name');
    expect(field).toHaveValue('Periclase, trial 3');
    await user.clear(field);
    await user.type(field, 'Periclase, trial 4{Enter}');
    expect(await screen.findByText('That name is too long.')).toBeInTheDocument();
    api.on({ [route]: answer(latticeSummary, { ...magnesia, name: 'Periclase, trial 4' }) });
    await user.click(screen.getByRole('button', { name: 'Rename' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
    expect(api.last(route)?.body).toEqual({ name: 'Periclase, trial 4' });
  });

  it('edits tags', async () => {
    const api = shelfWith();
    const route = `PATCH ${lattices}/${magnesia.id}`;
    api.on({ [route]: answer(latticeSummary, magnesia) });
    const { user } = renderAt('/w/kiln-lane');
    await user.click(await screen.findByRole('button', { name: /What to do with Periclase/ }));
    await user.click(screen.getByRole('menuitem', { name: /Tags/ }));
    await user.click(await screen.findByRole('button', { name: 'Remove the tag separator' }));
    await user.type(screen.getByLabelText('Another tag'), 'reference, dry');
    await user.click(screen.getByRole('button', { name: 'Save the tags' }));
    await waitFor(() => expect(api.last(route)?.body).toEqual({ tags: ['reference', 'dry'] }));
  });

  it('shows what is deleted, and restores it', async () => {
    const deleted = { ...magnesia, deletedAt: '2026-11-30T09:00:00Z' };
    const api = shelfWith([deleted]);
    api.on({ [`POST ${lattices}/${magnesia.id}/restore`]: answer(latticeSummary, magnesia) });
    const { user } = renderAt('/w/kiln-lane?deleted=true');
    expect(await screen.findByRole('heading', { name: 'Deleted lattices' })).toBeInTheDocument();
    expect(lastAsked(api)).toMatchObject({ deleted: 'true' });
    expect(screen.queryByRole('link', { name: 'Periclase, trial 3' })).not.toBeInTheDocument();
    await user.click(await screen.findByRole('button', { name: 'Restore Periclase, trial 3' }));
    expect(await screen.findByText(/is back on the shelf/)).toBeInTheDocument();
  });

  it('offers a reader nothing they may not do', async () => {
    shelfWith([magnesia], 'reader');
    renderAt('/w/kiln-lane');
    await screen.findByRole('table');
    expect(screen.queryByRole('link', { name: 'New lattice' })).not.toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /What to do with/ })).not.toBeInTheDocument();
  });
});

describe('a shelf with nothing to show', () => {
  it('leads to the first lattice when it is empty', async () => {
    shelfWith([], 'crystallographer');
    renderAt('/w/kiln-lane');
    expect(await screen.findByText('The shelf is empty')).toBeInTheDocument();
    const links = screen.getAllByRole('link', { name: 'New lattice' });
    expect(links[0]).toHaveAttribute('href', '/w/kiln-lane/new');
  });

  it('leads back to everything when nothing fits', async () => {
    shelfWith([]);
    const { user, address } = renderAt('/w/kiln-lane?search=unobtainium');
    await user.click(await screen.findByRole('button', { name: 'Show all lattices' }));
    await waitFor(() => expect(address()).toBe('/w/kiln-lane'));
  });

  it('shows a failure and tries again', async () => {
    const api = shelfWith();
    api.on({ [`GET ${lattices}`]: refuse('server.busy') });
    const { user } = renderAt('/w/kiln-lane');
    expect(await screen.findByText('The shelf could not be fetched')).toBeInTheDocument();
    api.on({ [`GET ${lattices}`]: answer(shelfPage, shelfOf([magnesia])) });
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('link', { name: 'Periclase, trial 3' })).toBeInTheDocument();
  });
});

describe('on a phone', () => {
  it('lays the shelf out as cards', async () => {
    vi.stubGlobal('matchMedia', (query: string) => ({
      matches: query === '(max-width: 767px)',
      addEventListener: () => undefined,
      removeEventListener: () => undefined,
    }));
    shelfWith();
    renderAt('/w/kiln-lane');
    const list = await screen.findByRole('list', { name: 'Lattices' });
    expect(within(list).getAllByRole('listitem')).toHaveLength(2);
    expect(screen.queryByRole('table')).not.toBeInTheDocument();
  });
});
