import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { sessionState, type Role } from '#common/schemas/auth';
import { shelfPage } from '#common/schemas/lattice';
import { auditPage, workspaceDetail } from '#common/schemas/workspace';
import { answer, fakeApi, type FakeApi } from '#client/testing/fake-api.ts';
import { idOf, sessionOf, shelfOf, userOf } from '#client/testing/factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

const base = '/workspaces/kiln-lane';
const detail = {
  id: idOf(90),
  slug: 'kiln-lane',
  name: 'Kiln Lane',
  role: 'owner',
  readersMayComment: true,
  requiresSecondPerson: true,
  createdAt: '2026-10-01T08:00:00Z',
} as const;

function workspaceWith(role: Role = 'owner'): FakeApi {
  return fakeApi({
    'GET /session': answer(sessionState, sessionOf({ user: userOf(role) })),
    [`GET ${base}/lattices`]: answer(shelfPage, shelfOf([])),
    [`PATCH ${base}`]: answer(workspaceDetail, detail),
    [`GET ${base}/audit`]: answer(auditPage, {
      items: [
        {
          id: idOf(300),
          at: '2026-11-30T08:00:00Z',
          actorName: 'Mara Velt',
          action: 'revision.submit',
          subject: 'Periclase, trial 3',
          detail: 'revision 4',
        },
        {
          id: idOf(301),
          at: '2026-11-29T08:00:00Z',
          actorName: null,
          action: 'something.new_here',
          subject: null,
          detail: null,
        },
      ],
      page: 1,
      pageSize: 50,
      total: 70,
    }),
  });
}

describe('settings', () => {
  it('switches the second person off', async () => {
    const api = workspaceWith();
    const { user } = renderAt('/w/kiln-lane/settings');
    const toggle = await screen.findByRole('switch', { name: 'A second person accepts' });
    expect(toggle).toBeChecked();
    await user.click(toggle);
    await waitFor(() =>
      expect(api.last(`PATCH ${base}`)?.body).toEqual({ requiresSecondPerson: false }),
    );
    expect(await screen.findByText('Saved')).toBeInTheDocument();
  });

  it('renames the workspace, and wants a name', async () => {
    const api = workspaceWith();
    const { user } = renderAt('/w/kiln-lane/settings');
    const field = await screen.findByLabelText('Name');
    await user.clear(field);
    await user.click(screen.getByRole('button', { name: 'Save the name' }));
    await waitFor(() => expect(field).toBeInvalid());
    expect(api.last(`PATCH ${base}`)).toBeUndefined();
    await user.type(field, 'Kiln Lane, hall 2');
    await user.click(screen.getByRole('button', { name: 'Save the name' }));
    await waitFor(() =>
      expect(api.last(`PATCH ${base}`)?.body).toEqual({ name: 'Kiln Lane, hall 2' }),
    );
  });

  it('is for owners', async () => {
    workspaceWith('crystallographer');
    renderAt('/w/kiln-lane/settings');
    expect(await screen.findByText(/Only an owner of Kiln Lane/)).toBeInTheDocument();
  });
});

describe('audit log', () => {
  it('tells who did what, and pages', async () => {
    workspaceWith();
    renderAt('/w/kiln-lane/audit');
    const entry = (await screen.findByText('Periclase, trial 3')).closest('li');
    expect(entry).toHaveTextContent('Mara Velt submitted for review Periclase, trial 3');
    expect(entry).toHaveTextContent('revision 4');
    expect(screen.getByText('Someone unknown').closest('li')).toHaveTextContent(
      'something new here',
    );
    expect(screen.getByRole('link', { name: 'Next page' })).toHaveAttribute(
      'href',
      '/w/kiln-lane/audit?page=2',
    );
  });

  it('is for owners', async () => {
    const api = workspaceWith('reviewer');
    renderAt('/w/kiln-lane/audit');
    expect(await screen.findByText(/Only an owner of Kiln Lane/)).toBeInTheDocument();
    expect(api.last(`GET ${base}/audit`)).toBeUndefined();
  });
});
