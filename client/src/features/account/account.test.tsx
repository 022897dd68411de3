import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { currentUser, sessionList, sessionState } from '#common/schemas/auth';
import { done } from '#common/schemas/shared';
import { describeDevice } from '#client/features/account/describe-device.ts';
import { answer, fakeApi, refuse, type FakeApi } from '#client/testing/fake-api.ts';
import { sessionOf, userOf } from '#client/testing/factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

const firefox = 'Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0';
const times = {
  createdAt: '2026-11-29T08:00:00Z',
  lastSeenAt: '2026-11-30T08:00:00Z',
  expiresAt: '2026-12-30T08:00:00Z',
};

function accountServer(): FakeApi {
  return fakeApi({
    'GET /session': answer(sessionState, sessionOf({ user: userOf() })),
    'GET /me/sessions': answer(sessionList, {
      items: [
        { id: 's1', isCurrent: true, address: '127.0.0.1', userAgent: null, ...times },
        { id: 's2', isCurrent: false, address: '10.1.4.22', userAgent: firefox, ...times },
      ],
    }),
    'PATCH /me': answer(currentUser, userOf('owner', { name: 'Oda Rehn-Falk' })),
    'POST /me/password': answer(done, { ok: true }),
    'DELETE /me/sessions/s2': answer(done, { ok: true }),
  });
}

describe('account', () => {
  it('changes the name', async () => {
    const api = accountServer();
    const { user } = renderAt('/me');
    const field = await screen.findByLabelText('Name');
    expect(screen.getByRole('button', { name: 'Save the name' })).toBeDisabled();
    await user.type(field, '-Falk');
    await user.click(screen.getByRole('button', { name: 'Save the name' }));
    expect(await screen.findByText('Your name is saved')).toBeInTheDocument();
    expect(api.last('PATCH /me')?.body).toEqual({ name: 'Oda Rehn-Falk' });
  });

  it('changes the password, and shows a wrong present one where it was typed', async () => {
    const api = accountServer();
    api.on({ 'POST /me/password': refuse('auth.bad_credentials') });
    const { user } = renderAt('/me');
    await user.type(await screen.findByLabelText('Present password'), 'not it');
    await user.type(screen.getByLabelText('New password'), 'a much longer one');
    await user.click(screen.getByRole('button', { name: 'Change the password' }));
    await waitFor(() => expect(screen.getByLabelText('Present password')).toBeInvalid());
    api.on({ 'POST /me/password': answer(done, { ok: true }) });
    await user.type(screen.getByLabelText('Present password'), ', this is');
    await user.click(screen.getByRole('button', { name: 'Change the password' }));
    expect(await screen.findByText('Your password is changed')).toBeInTheDocument();
    expect(screen.getByLabelText('New password')).toHaveValue('');
  });

  it('ends a session elsewhere, never this one', async () => {
    const api = accountServer();
    const { user } = renderAt('/me');
    expect(await screen.findByText('this one')).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'End the session on Firefox on Linux' }));
    expect(await screen.findByText('That session has ended')).toBeInTheDocument();
    expect(api.last('DELETE /me/sessions/s2')).toBeDefined();
    expect(screen.getAllByRole('button', { name: /^End the session/ })).toHaveLength(1);
  });
});

describe('describeDevice', () => {
  it.each([
    [firefox, 'Firefox on Linux'],
    ['Mozilla/5.0 (iPhone; CPU iPhone OS 18_0) Version/18.0 Safari/604.1', 'Safari on iOS'],
    ['Mozilla/5.0 (Windows NT 10.0) Chrome/140.0 Safari/537.36 Edg/140.0', 'Edge on Windows'],
    ['curl/8.5.0', 'Unknown device'],
    [null, 'Unknown device'],
  ])('%s is %s', (userAgent, words) => {
    expect(describeDevice(userAgent)).toBe(words);
  });
});
