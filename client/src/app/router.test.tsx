import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { sessionState } from '#common/schemas/auth';
import { shelfPage } from '#common/schemas/lattice';
import { answer, fakeApi, refuse } from '#client/testing/fake-api.ts';
import { latticeOf, membershipOf, sessionOf, shelfOf, userOf } from '#client/testing/factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

const shelf = answer(shelfPage, shelfOf([latticeOf()]));
const signedIn = answer(sessionState, sessionOf({ user: userOf() }));

describe('where an address leads', () => {
  it('leads a stranger to the sign-in page and keeps where they wanted to go', async () => {
    fakeApi({ 'GET /session': answer(sessionState, sessionOf()) });
    const { address } = renderAt('/w/kiln-lane?state=returned');
    expect(await screen.findByRole('heading', { name: 'Sign in' })).toBeInTheDocument();
    expect(address()).toBe(`/sign-in?to=${encodeURIComponent('/w/kiln-lane?state=returned')}`);
    expect(screen.queryByText(/session ended/)).not.toBeInTheDocument();
  });

  it('leads to the set-up page on an empty server', async () => {
    fakeApi({ 'GET /session': answer(sessionState, sessionOf({ needsSetup: true })) });
    const { address } = renderAt('/');
    expect(await screen.findByRole('heading', { name: 'Set up Holdfast' })).toBeInTheDocument();
    expect(address()).toBe('/setup');
  });

  it('opens the workspace seen last, and remembers it', async () => {
    const second = membershipOf({ workspaceSlug: 'glaze-bench', workspaceName: 'Glaze Bench' });
    localStorage.setItem('holdfast.last-workspace', 'glaze-bench');
    fakeApi({
      'GET /session': answer(
        sessionState,
        sessionOf({ user: userOf('owner', { memberships: [membershipOf(), second] }) }),
      ),
      'GET /workspaces/glaze-bench/lattices': shelf,
    });
    const { address } = renderAt('/');
    expect(await screen.findByRole('link', { name: 'Periclase, trial 3' })).toBeInTheDocument();
    expect(address()).toBe('/w/glaze-bench');
    expect(document.title).toBe('Glaze Bench · Holdfast');
  });

  it('says what to do to someone without a workspace', async () => {
    fakeApi({
      'GET /session': answer(
        sessionState,
        sessionOf({ user: userOf('owner', { memberships: [] }) }),
      ),
    });
    renderAt('/');
    expect(await screen.findByText(/Ask the owner of your group/)).toBeInTheDocument();
  });

  it('shows a workspace one does not belong to as missing', async () => {
    fakeApi({ 'GET /session': signedIn });
    renderAt('/w/elsewhere');
    expect(await screen.findByText('Nothing stands here')).toBeInTheDocument();
  });

  it('shows an address that is no page as missing, signed in or not', async () => {
    fakeApi({ 'GET /session': answer(sessionState, sessionOf()) });
    renderAt('/no/such/page');
    expect(await screen.findByText('Nothing stands here')).toBeInTheDocument();
  });

  it('asks to sign in again when the session ended meanwhile, and says so', async () => {
    const api = fakeApi({ 'GET /session': signedIn });
    api.on({ 'GET /workspaces/kiln-lane/lattices': refuse('auth.required') });
    const { address } = renderAt('/w/kiln-lane');
    expect(await screen.findByText(/Your session ended/)).toBeInTheDocument();
    expect(address()).toBe('/sign-in?to=%2Fw%2Fkiln-lane&reason=expired');
  });

  it('shows the failure, and a way on, when not even the session can be fetched', async () => {
    fakeApi({ 'GET /session': refuse('server.unexpected') });
    renderAt('/');
    expect(await screen.findByText('This page stopped working')).toBeInTheDocument();
    expect(screen.getByText(/Quote this number.*req-1/)).toBeInTheDocument();
  });
});
