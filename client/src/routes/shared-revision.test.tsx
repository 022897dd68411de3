import { screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { sharedRevision } from '#common/schemas/sharing';
import { spaceGroupDetail } from '#common/schemas/symmetry';
import { answer, fakeApi, refuse } from '#client/testing/fake-api.ts';
import { revisionOf, spaceGroupOf } from '#client/testing/lattice-factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

// jsdom has no canvas; the stage has tests of its own.
vi.mock('#client/scene/viewer.tsx', () => ({ LatticeViewer: () => <div>stage</div> }));

const token = 'T'.repeat(43);

describe('a shared revision', () => {
  it('shows the frozen revision to someone without an account', async () => {
    const { id: _id, latticeId: _latticeId, ...revision } = revisionOf({ state: 'accepted' });
    const api = fakeApi({
      'GET /space-groups/1': answer(spaceGroupDetail, spaceGroupOf()),
      [`GET /shares/${token}`]: answer(sharedRevision, {
        workspaceName: 'Kiln Lane',
        revision,
        expiresAt: '2027-01-01T08:00:00Z',
      }),
    });
    renderAt(`/s/${token}`);
    expect(await screen.findByText(/Revision 4 by Oda Rehn, Kiln Lane/)).toBeInTheDocument();
    expect(screen.getByText('Accepted')).toBeInTheDocument();
    expect(await screen.findByRole('grid', { name: 'Pair ledger' })).toBeInTheDocument();
    expect(screen.queryByRole('link', { name: /Remarks/ })).not.toBeInTheDocument();
    expect(api.requests.some(({ path }) => path.startsWith('/workspaces'))).toBe(false);
  });

  it('says so when the link shows nothing any more', async () => {
    fakeApi({ [`GET /shares/${token}`]: refuse('share.not_found') });
    renderAt(`/s/${token}`);
    expect(await screen.findByText('This link shows nothing')).toBeInTheDocument();
  });
});
