import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { invitationPreview, sessionState, type InvitationPreview } from '#common/schemas/auth';
import { shelfPage } from '#common/schemas/lattice';
import { answer, fakeApi, refuse, type FakeApi } from '#client/testing/fake-api.ts';
import { sessionOf, shelfOf, userOf } from '#client/testing/factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

const token = 'A'.repeat(43);
const accept = `POST /invitations/${token}/accept`;

function serverWith(
  user: ReturnType<typeof userOf> | null,
  change: Partial<InvitationPreview> = {},
): FakeApi {
  return fakeApi({
    'GET /session': answer(sessionState, sessionOf({ user })),
    [`GET /invitations/${token}`]: answer(invitationPreview, {
      workspaceName: 'Kiln Lane',
      workspaceSlug: 'kiln-lane',
      email: 'new.person@kilnlane.example',
      role: 'reviewer',
      invitedBy: 'Oda Rehn',
      hasAccount: false,
      expiresAt: '2026-12-09T08:00:00Z',
      ...change,
    }),
    [accept]: answer(sessionState, sessionOf({ user: userOf('reviewer') })),
    'GET /workspaces/kiln-lane/lattices': answer(shelfPage, shelfOf([])),
  });
}

describe('an invitation', () => {
  it('makes an account for someone new and leads into the workspace', async () => {
    const api = serverWith(null);
    const { user, address } = renderAt(`/accept-invite/${token}`);
    expect(await screen.findByText(/Oda Rehn invites you as reviewer/)).toBeInTheDocument();
    await user.type(screen.getByLabelText('Your name'), 'New Person');
    await user.type(screen.getByLabelText('Choose a password'), 'short');
    await user.click(screen.getByRole('button', { name: 'Join Kiln Lane' }));
    expect(await screen.findByText('Use at least 12 characters.')).toBeInTheDocument();
    await user.type(screen.getByLabelText('Choose a password'), ' but now longer');
    await user.click(screen.getByRole('button', { name: 'Join Kiln Lane' }));
    await waitFor(() => expect(address()).toBe('/w/kiln-lane'));
    expect(api.last(accept)?.body).toEqual({
      name: 'New Person',
      password: 'short but now longer',
    });
  });

  it('asks someone with an account to sign in first, and comes back', async () => {
    serverWith(null, { hasAccount: true });
    renderAt(`/accept-invite/${token}`);
    const link = await screen.findByRole('link', { name: 'Sign in' });
    expect(link).toHaveAttribute('href', `/sign-in?to=%2Faccept-invite%2F${token}`);
  });

  it('takes one click of the invited person who is signed in', async () => {
    const api = serverWith(userOf('reader', { email: 'new.person@kilnlane.example' }), {
      hasAccount: true,
    });
    const { user, address } = renderAt(`/accept-invite/${token}`);
    await user.click(await screen.findByRole('button', { name: 'Join Kiln Lane' }));
    await waitFor(() => expect(address()).toBe('/w/kiln-lane'));
    expect(api.last(accept)?.body).toEqual({});
  });

  it('is not for the person who happens to be signed in', async () => {
    serverWith(userOf());
    renderAt(`/accept-invite/${token}`);
    expect(await screen.findByText(/and you are signed in as/)).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /Join/ })).not.toBeInTheDocument();
  });

  it('says that it was used or is out of date', async () => {
    const api = serverWith(null);
    api.on({ [`GET /invitations/${token}`]: refuse('invitation.not_found') });
    renderAt(`/accept-invite/${token}`);
    expect(await screen.findByText('This invitation is not valid')).toBeInTheDocument();
    expect(screen.getByText(/it was used, withdrawn or is out of date/)).toBeInTheDocument();
  });
});
