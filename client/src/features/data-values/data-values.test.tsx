import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { sessionState, type Role } from '#common/schemas/auth';
import { ownDataValue, ownDataValueList, type OwnDataValue } from '#common/schemas/data-values';
import { done } from '#common/schemas/shared';
import { idOf, sessionOf, userOf } from '#client/testing/factories.ts';
import { answer, fakeApi, refuse, type FakeApi } from '#client/testing/fake-api.ts';
import { renderAt } from '#client/testing/render-at.tsx';

const base = '/workspaces/kiln-lane/data-values';
const sodium = `${base}/${encodeURIComponent('ionisation:Na:1')}`;

const ownOf = (change: Partial<OwnDataValue> = {}): OwnDataValue => ({
  key: 'ionisation:Na:1',
  value: 497,
  note: 'Bench notes, 3 May',
  setBy: { id: idOf(2), name: 'Mara Velt', initials: 'MV' },
  setAt: '2026-11-30T08:00:00Z',
  ...change,
});

function valuesWith(own: OwnDataValue[], role: Role = 'crystallographer'): FakeApi {
  return fakeApi({
    'GET /session': answer(sessionState, sessionOf({ user: userOf(role) })),
    [`GET ${base}`]: answer(ownDataValueList, { items: own }),
    [`PUT ${sodium}`]: answer(ownDataValue, ownOf()),
    [`DELETE ${sodium}`]: answer(done, { ok: true }),
  });
}

const rowsShown = async () =>
  within(await screen.findByRole('list', { name: 'Values' })).getAllByRole('listitem');

describe('data values', () => {
  it('shows a shipped value with unit, source and how far it was verified', async () => {
    valuesWith([], 'reader');
    renderAt('/w/kiln-lane/data?search=Na&kind=ionisation');
    const [first] = await rowsShown();
    // Any table of ionisation energies: 495.8 kJ/mol for sodium.
    expect(first).toHaveTextContent('Na first electron taken');
    expect(first).toHaveTextContent('495.8 kJ/mol');
    expect(first).toHaveTextContent('Principles of General Chemistry 1.0, appendix J');
    expect(first).toHaveTextContent('verified');
    expect(screen.getByText(/^4 of \d+ values$/)).toBeInTheDocument();
  });

  it('lets those who may not change values read them, and says who may', async () => {
    valuesWith([ownOf()], 'reader');
    renderAt('/w/kiln-lane/data?search=Na&kind=ionisation');
    const [first] = await rowsShown();
    expect(first).toHaveTextContent('497 kJ/mol ours');
    expect(screen.getByText(/Owners and crystallographers can/)).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /our own value|Change our/ })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Add a value' })).toBeNull();
  });

  it('finds by element, by name, by standing, and keeps the search in the address', async () => {
    valuesWith([]);
    const { user, address } = renderAt('/w/kiln-lane/data');
    const field = await screen.findByRole('searchbox', { name: 'Find' });
    await user.click(field);
    await user.paste('oxygen memory gained');
    await waitFor(async () => expect(await rowsShown()).toHaveLength(1));
    expect((await rowsShown())[0]).toHaveTextContent('O second electron gained');
    await user.clear(field);
    await user.paste('Fe2+ radius low');
    await waitFor(async () => expect(await rowsShown()).toHaveLength(1));
    expect((await rowsShown())[0]).toHaveTextContent('0.61 Å');
    expect(address()).toBe('/w/kiln-lane/data?search=Fe2%2B+radius+low');
    await user.clear(field);
    await user.paste('unobtainium');
    expect(await screen.findByText('No such value')).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'Show all values' }));
    expect(await rowsShown()).toHaveLength(50);
    expect(address()).toBe('/w/kiln-lane/data');
  });

  it('puts our own value in place, and offers the way back', async () => {
    const api = valuesWith([]);
    const { user } = renderAt('/w/kiln-lane/data?search=Na&kind=ionisation');
    await user.click(
      await screen.findByRole('button', { name: /Ionisation energy of Na, first electron taken/ }),
    );
    const dialog = await screen.findByRole('dialog');
    expect(dialog).toHaveTextContent('Shipped: 495.8 kJ/mol');
    const field = within(dialog).getByLabelText('Our value');
    await user.type(field, '−3');
    await user.click(within(dialog).getByRole('button', { name: 'Save' }));
    expect(
      await within(dialog).findByText(
        'Ionisation energy must lie between 1 kJ/mol and 200,000 kJ/mol.',
      ),
    ).toBeInTheDocument();
    expect(field).toBeInvalid();
    expect(api.last(`PUT ${sodium}`)).toBeUndefined();
    await user.clear(field);
    await user.type(field, '497,0');
    await user.type(within(dialog).getByLabelText('Where it comes from'), ' Bench notes ');
    api.on({ [`GET ${base}`]: answer(ownDataValueList, { items: [ownOf()] }) });
    await user.click(within(dialog).getByRole('button', { name: 'Save' }));
    await waitFor(() =>
      expect(api.last(`PUT ${sodium}`)?.body).toEqual({ value: 497, note: 'Bench notes' }),
    );
    await waitFor(async () => expect((await rowsShown())[0]).toHaveTextContent('ours'));
    expect((await rowsShown())[0]).toHaveTextContent('shipped: 495.8');
    await user.click(await screen.findByRole('button', { name: 'Undo' }));
    await waitFor(() => expect(api.last(`DELETE ${sodium}`)).toBeDefined());
  });

  it('goes back to the shipped value, and can undo that', async () => {
    const api = valuesWith([ownOf()]);
    const { user } = renderAt('/w/kiln-lane/data?show=ours');
    await user.click(await screen.findByRole('button', { name: /^Change our value/ }));
    api.on({ [`GET ${base}`]: answer(ownDataValueList, { items: [] }) });
    await user.click(await screen.findByRole('button', { name: 'Back to the shipped value' }));
    await waitFor(() => expect(api.last(`DELETE ${sodium}`)).toBeDefined());
    expect(await screen.findByText('No value of our own')).toBeInTheDocument();
    await user.click(await screen.findByRole('button', { name: 'Undo' }));
    await waitFor(() =>
      expect(api.last(`PUT ${sodium}`)?.body).toEqual({ value: 497, note: 'Bench notes, 3 May' }),
    );
  });

  it('gives a value where none is shipped, and refuses what is no ion', async () => {
    const api = valuesWith([]);
    const uranium = `${base}/${encodeURIComponent('born-exponent:U+4')}`;
    const added = ownOf({ key: 'born-exponent:U+4', value: 13, note: '' });
    api.on({ [`PUT ${uranium}`]: answer(ownDataValue, added) });
    const { user } = renderAt('/w/kiln-lane/data');
    await user.click(await screen.findByRole('button', { name: 'Add a value' }));
    const dialog = await screen.findByRole('dialog');
    const subject = within(dialog).getByLabelText('Of what');
    await user.type(subject, 'Uu+4');
    expect(within(dialog).getByText(/no such element or ion/)).toBeInTheDocument();
    await user.clear(subject);
    await user.click(within(dialog).getByRole('button', { name: 'Save' }));
    expect(within(dialog).getByText('Say which element or ion.')).toBeInTheDocument();
    await user.type(subject, 'U+4');
    expect(within(dialog).getByText('No value is shipped.')).toBeInTheDocument();
    await user.type(within(dialog).getByLabelText('Our value'), '13');
    api.on({ [`GET ${base}`]: answer(ownDataValueList, { items: [added] }) });
    await user.click(within(dialog).getByRole('button', { name: 'Save' }));
    await waitFor(() => expect(api.last(`PUT ${uranium}`)?.body).toEqual({ value: 13, note: '' }));
    await waitFor(async () => expect((await rowsShown())[0]).toHaveTextContent('none shipped'));
  });

  it('says what went wrong: loading and saving', async () => {
    const api = valuesWith([]);
    api.on({ [`GET ${base}`]: refuse('server.unexpected') });
    const { user } = renderAt('/w/kiln-lane/data?search=Na&kind=ionisation');
    expect(await screen.findByText('This could not be shown')).toBeInTheDocument();
    api.on({
      [`GET ${base}`]: answer(ownDataValueList, { items: [] }),
      [`PUT ${sodium}`]: refuse('data.too_many'),
    });
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    await user.click(await screen.findByRole('button', { name: /Na, first electron taken/ }));
    const dialog = await screen.findByRole('dialog');
    await user.type(within(dialog).getByLabelText('Our value'), '497');
    await user.click(within(dialog).getByRole('button', { name: 'Save' }));
    expect(await within(dialog).findByRole('alert')).toHaveTextContent(/as many values/);
  });
});
