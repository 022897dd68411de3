import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { createdInvitation, invitationList, sessionState, type Role } from '#common/schemas/auth';
import { shelfPage } from '#common/schemas/lattice';
import { done } from '#common/schemas/shared';
import { member, memberList } from '#common/schemas/workspace';
import { answer, fakeApi, refuse, type FakeApi } from '#client/testing/fake-api.ts';
import { idOf, memberOf, sessionOf, shelfOf, userOf } from '#client/testing/factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

const base = '/workspaces/kiln-lane';
const token = 'B'.repeat(43);
const mara = memberOf({
  userId: idOf(2),
  name: 'Mara Velt',
  initials: 'MV',
  email: 'mara.velt@kilnlane.example',
  role: 'crystallographer',
});

function workspaceWith(role: Role = 'owner'): FakeApi {
  return fakeApi({
    'GET /session': answer(sessionState, sessionOf({ user: userOf(role) })),
    [`GET ${base}/members`]: answer(memberList, { items: [memberOf({ role }), mara] }),
    [`GET ${base}/lattices`]: answer(shelfPage, shelfOf([])),
    [`GET ${base}/invitations`]: answer(invitationList, {
      items: [
        {
          id: idOf(200),
          email: 'new.person@kilnlane.example',
          role: 'reviewer',
          invitedBy: 'Oda Rehn',
          createdAt: '2026-11-30T08:00:00Z',
          expiresAt: '2026-12-07T08:00:00Z',
        },
      ],
    }),
  });
}

describe('members', () => {
  it('lists who belongs, and who is invited', async () => {
    workspaceWith();
    renderAt('/w/kiln-lane/members');
    expect(await screen.findByText('Mara Velt')).toBeInTheDocument();
    expect(screen.getByText('(you)')).toBeInTheDocument();
    expect(await screen.findByText('new.person@kilnlane.example')).toBeInTheDocument();
  });

  it('changes a role', async () => {
    const api = workspaceWith();
    const route = `PATCH ${base}/members/${mara.userId}`;
    api.on({ [route]: answer(member, { ...mara, role: 'reviewer' }) });
    const { user } = renderAt('/w/kiln-lane/members');
    await user.click(
      await screen.findByRole('button', { name: 'Role of Mara Velt: Crystallographer' }),
    );
    await user.click(await screen.findByRole('option', { name: /Reviewer/ }));
    expect(await screen.findByText('Mara Velt is reviewer now')).toBeInTheDocument();
    expect(api.last(route)?.body).toEqual({ role: 'reviewer' });
  });

  it('says why the last owner can’t become something else', async () => {
    const api = workspaceWith();
    api.on({ [`PATCH ${base}/members/${idOf(1)}`]: refuse('member.last_owner') });
    const { user } = renderAt('/w/kiln-lane/members');
    await user.click(await screen.findByRole('button', { name: 'Role of Oda Rehn: Owner' }));
    await user.click(await screen.findByRole('option', { name: /Reader/ }));
    expect(await screen.findByText(/A workspace needs an owner/)).toBeInTheDocument();
  });

  it('removes someone after asking', async () => {
    const api = workspaceWith();
    const route = `DELETE ${base}/members/${mara.userId}`;
    api.on({ [route]: answer(done, { ok: true }) });
    const { user } = renderAt('/w/kiln-lane/members');
    await user.click(await screen.findByRole('button', { name: 'Remove Mara Velt' }));
    const dialog = await screen.findByRole('dialog', { name: 'Remove Mara Velt?' });
    expect(api.last(route)).toBeUndefined();
    await user.click(within(dialog).getByRole('button', { name: 'Remove' }));
    expect(await screen.findByText('Mara Velt is removed')).toBeInTheDocument();
    expect(api.last(route)).toBeDefined();
  });

  it('invites, and shows the link this once', async () => {
    const api = workspaceWith();
    const route = `POST ${base}/invitations`;
    api.on({
      [route]: answer(createdInvitation, {
        id: idOf(201),
        token,
        email: 'lab.guest@kilnlane.example',
        role: 'reader',
        expiresAt: '2026-12-08T08:00:00Z',
      }),
    });
    const { user } = renderAt('/w/kiln-lane/members');
    await user.click(await screen.findByRole('button', { name: 'Invite' }));
    await user.type(await screen.findByLabelText('E-mail'), 'lab.guest@kilnlane.example');
    await user.click(screen.getByRole('button', { name: 'Make the link' }));
    const link = await screen.findByLabelText('Invitation link');
    expect(link).toHaveValue(`${window.location.origin}/accept-invite/${token}`);
    expect(screen.getByText('is shown only now')).toBeInTheDocument();
    expect(api.last(route)?.body).toEqual({ email: 'lab.guest@kilnlane.example', role: 'reader' });
    await user.click(screen.getByRole('button', { name: 'Done' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
    await user.click(screen.getByRole('button', { name: 'Invite' }));
    expect(await screen.findByLabelText('E-mail')).toHaveValue('');
  });

  it('withdraws an invitation', async () => {
    const api = workspaceWith();
    const route = `DELETE ${base}/invitations/${idOf(200)}`;
    api.on({ [route]: answer(done, { ok: true }) });
    const { user } = renderAt('/w/kiln-lane/members');
    await user.click(await screen.findByRole('button', { name: /Withdraw the invitation/ }));
    expect(await screen.findByText('The invitation is withdrawn')).toBeInTheDocument();
  });

  it('lets a reader see and leave, no more', async () => {
    const api = workspaceWith('reader');
    renderAt('/w/kiln-lane/members');
    expect(await screen.findByText('Mara Velt')).toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'Leave' })).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /Remove|Invite|Role of/ })).not.toBeInTheDocument();
    expect(api.last(`GET ${base}/invitations`)).toBeUndefined();
  });
});
