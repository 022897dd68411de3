import { screen, waitFor } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { sessionState, type Role } from '#common/schemas/auth';
import { shelfPage } from '#common/schemas/lattice';
import { done } from '#common/schemas/shared';
import { setThemePreference } from '#client/lib/theme.ts';
import { answer, fakeApi, type FakeApi } from '#client/testing/fake-api.ts';
import { idOf, membershipOf, sessionOf, shelfOf, userOf } from '#client/testing/factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

const second = membershipOf({
  workspaceId: idOf(91),
  workspaceSlug: 'glaze-bench',
  workspaceName: 'Glaze Bench',
  role: 'reader',
});

function signedInAs(role: Role, waiting = 0): FakeApi {
  const user = userOf(role, { memberships: [membershipOf({ role }), second] });
  const shelf = answer(shelfPage, shelfOf([], { total: waiting }));
  return fakeApi({
    'GET /session': answer(sessionState, sessionOf({ user })),
    'DELETE /session': answer(done, { ok: true }),
    'GET /workspaces/kiln-lane/lattices': shelf,
    'GET /workspaces/glaze-bench/lattices': shelf,
  });
}

afterEach(() => setThemePreference('system'));

describe('top bar', () => {
  it('switches to another workspace', async () => {
    signedInAs('owner');
    const { user, address } = renderAt('/w/kiln-lane');
    await user.click(await screen.findByRole('button', { name: 'Kiln Lane' }));
    await user.click(screen.getByRole('menuitem', { name: 'Glaze Bench' }));
    await waitFor(() => expect(address()).toBe('/w/glaze-bench'));
    expect(await screen.findByRole('button', { name: 'Glaze Bench' })).toBeInTheDocument();
  });

  it.each([
    ['owner', true],
    ['crystallographer', false],
  ] as const)('shows the owner’s pages to an owner only: %s', async (role, isShown) => {
    signedInAs(role);
    const { user } = renderAt('/w/kiln-lane');
    await user.click(await screen.findByRole('button', { name: 'Kiln Lane' }));
    expect(screen.getByRole('menuitem', { name: 'Members' })).toBeInTheDocument();
    expect(screen.queryAllByRole('menuitem', { name: /Settings|Audit/ })).toHaveLength(
      isShown ? 2 : 0,
    );
  });

  it.each([
    ['reviewer', '3 in review', '/w/kiln-lane?state=in_review'],
    ['crystallographer', '3 returned', '/w/kiln-lane?state=returned'],
  ] as const)('tells a %s what waits for them', async (role, words, href) => {
    signedInAs(role, 3);
    renderAt('/w/kiln-lane');
    expect(await screen.findByRole('link', { name: words })).toHaveAttribute('href', href);
  });

  it('searches the shelf from another page', async () => {
    const api = signedInAs('owner');
    const { user, address } = renderAt('/w/kiln-lane/settings');
    await screen.findByRole('heading', { name: 'Settings' });
    await user.keyboard('/');
    await user.keyboard('spinel{Enter}');
    await waitFor(() => expect(address()).toBe('/w/kiln-lane?search=spinel'));
    await waitFor(() =>
      expect(api.requests.some(({ query }) => query['search'] === 'spinel')).toBe(true),
    );
  });

  it('changes the theme', async () => {
    signedInAs('owner');
    const { user } = renderAt('/w/kiln-lane');
    await user.click(await screen.findByRole('button', { name: /account and theme/ }));
    await user.click(screen.getByRole('menuitem', { name: 'Dark' }));
    expect(document.documentElement).toHaveClass('dark');
  });

  it('signs out by loading the sign-in page afresh', async () => {
    const api = signedInAs('owner');
    const assign = vi.fn();
    const { user } = renderAt('/w/kiln-lane');
    await user.click(await screen.findByRole('button', { name: /account and theme/ }));
    vi.stubGlobal('location', { ...window.location, assign });
    await user.click(screen.getByRole('menuitem', { name: 'Sign out' }));
    await waitFor(() => expect(assign).toHaveBeenCalledWith('/sign-in'));
    expect(api.last('DELETE /session')).toBeDefined();
  });
});

describe('connection', () => {
  it('says that there is none, for as long as there is none', async () => {
    signedInAs('owner');
    renderAt('/w/kiln-lane');
    await screen.findByRole('heading', { name: 'Lattices' });
    const online = vi.spyOn(navigator, 'onLine', 'get').mockReturnValue(false);
    window.dispatchEvent(new Event('offline'));
    expect(await screen.findByText(/No connection/)).toBeInTheDocument();
    online.mockReturnValue(true);
    window.dispatchEvent(new Event('online'));
    await waitFor(() => expect(screen.queryByText(/No connection/)).not.toBeInTheDocument());
    online.mockRestore();
  });
});
