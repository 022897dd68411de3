import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { sessionState } from '#common/schemas/auth';
import { shelfPage } from '#common/schemas/lattice';
import { answer, fakeApi, refuse, type FakeApi } from '#client/testing/fake-api.ts';
import { sessionOf, shelfOf, userOf } from '#client/testing/factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

const demo = {
  workspaceName: 'Kiln Lane',
  password: 'a demo password',
  people: [
    { name: 'Oda Rehn', email: 'oda.rehn@kilnlane.example', role: 'owner' as const },
    { name: 'Mara Velt', email: 'mara.velt@kilnlane.example', role: 'crystallographer' as const },
  ],
};

function serverWith(state: Parameters<typeof sessionOf>[0] = {}): FakeApi {
  return fakeApi({
    'GET /session': answer(sessionState, sessionOf(state)),
    'POST /session': answer(sessionState, sessionOf({ ...state, user: userOf() })),
    'GET /workspaces/kiln-lane/lattices': answer(shelfPage, shelfOf([])),
  });
}

describe('signing in', () => {
  it('signs in and goes where one wanted to go', async () => {
    const api = serverWith();
    const { user, address } = renderAt('/sign-in?to=%2Fw%2Fkiln-lane%3Fstate%3Ddraft');
    await user.type(await screen.findByLabelText('E-mail'), ' Oda.Rehn@KilnLane.example ');
    await user.type(screen.getByLabelText('Password'), 'right one');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    await waitFor(() => expect(address()).toBe('/w/kiln-lane?state=draft'));
    expect(api.last('POST /session')?.body).toEqual({
      email: 'oda.rehn@kilnlane.example',
      password: 'right one',
    });
  });

  it('names what is missing beside the field and asks the server nothing', async () => {
    const api = serverWith();
    const { user } = renderAt('/sign-in');
    await user.type(await screen.findByLabelText('E-mail'), 'oda');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByText(/Write an e-mail address like/)).toBeInTheDocument();
    expect(screen.getByText('Write your password.')).toBeInTheDocument();
    expect(api.last('POST /session')).toBeUndefined();
  });

  it('says that e-mail or password is wrong', async () => {
    const api = serverWith();
    api.on({ 'POST /session': refuse('auth.bad_credentials') });
    const { user } = renderAt('/sign-in');
    await user.type(await screen.findByLabelText('E-mail'), 'oda.rehn@kilnlane.example');
    await user.type(screen.getByLabelText('Password'), 'wrong{Enter}');
    expect(await screen.findByRole('alert')).toHaveTextContent('E-mail or password is not right.');
  });

  it('counts down while the account is slowed', async () => {
    const api = serverWith();
    api.on({ 'POST /session': refuse('auth.slowed', { retryAfterSeconds: 2 }) });
    const { user } = renderAt('/sign-in');
    await user.type(await screen.findByLabelText('E-mail'), 'oda.rehn@kilnlane.example');
    await user.type(screen.getByLabelText('Password'), 'wrong{Enter}');
    const button = await screen.findByRole('button', { name: /Wait [12] s/ });
    expect(button).toBeDisabled();
    expect(await screen.findByRole('button', { name: 'Sign in' })).toBeEnabled();
  });

  it('shows the demo’s people, says that it is a demo, and signs in as one of them', async () => {
    const api = serverWith({ demo });
    const { user, address } = renderAt('/sign-in');
    expect(await screen.findByText('This is a demonstration')).toBeInTheDocument();
    await user.click(
      screen.getByRole('button', { name: 'Sign in as Mara Velt, crystallographer' }),
    );
    await waitFor(() => expect(address()).toBe('/w/kiln-lane'));
    expect(api.last('POST /session')?.body).toEqual({
      email: 'mara.velt@kilnlane.example',
      password: 'a demo password',
    });
  });
});

describe('setting up an empty server', () => {
  it('makes the owner and leads to their workspace', async () => {
    const api = serverWith({ needsSetup: true });
    api.on({ 'POST /setup': answer(sessionState, sessionOf({ user: userOf() }), 201) });
    const { user, address } = renderAt('/setup');
    await user.type(await screen.findByLabelText('Your name'), 'Oda Rehn');
    await user.type(screen.getByLabelText('E-mail'), 'oda.rehn@kilnlane.example');
    await user.type(screen.getByLabelText('Password'), 'long enough for this');
    await user.type(screen.getByLabelText('Name of the workspace'), 'Kiln Lane');
    await user.click(screen.getByRole('button', { name: 'Set up Holdfast' }));
    await waitFor(() => expect(address()).toBe('/w/kiln-lane'));
  });

  it('shows a weak password at the password', async () => {
    const api = serverWith({ needsSetup: true });
    api.on({ 'POST /setup': refuse('auth.weak_password') });
    const { user } = renderAt('/setup');
    await user.type(await screen.findByLabelText('Your name'), 'Oda Rehn');
    await user.type(screen.getByLabelText('E-mail'), 'oda.rehn@kilnlane.example');
    await user.type(screen.getByLabelText('Password'), 'aaaaaaaaaaaa');
    await user.type(screen.getByLabelText('Name of the workspace'), 'Kiln Lane{Enter}');
    await waitFor(() => expect(screen.getByLabelText('Password')).toBeInvalid());
    expect(screen.getByText(/not easily guessed/)).toBeInTheDocument();
  });

  it('is closed once the server has its owner', async () => {
    serverWith();
    const { address } = renderAt('/setup');
    await waitFor(() => expect(address()).toBe('/sign-in'));
  });
});
