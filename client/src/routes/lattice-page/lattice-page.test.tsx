import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { sessionState, type Role } from '#common/schemas/auth';
import { storedEvaluation } from '#common/schemas/evaluation';
import {
  draft,
  latticeSummary,
  putDraftRequest,
  revisionDetail,
  revisionList,
  shelfPage,
  type RevisionDetail,
} from '#common/schemas/lattice';
import { annotation, annotationList } from '#common/schemas/review';
import { createdShare, shareList } from '#common/schemas/sharing';
import { spaceGroupDetail, spaceGroupList } from '#common/schemas/symmetry';
import { idOf, latticeOf, sessionOf, shelfOf, userOf } from '#client/testing/factories.ts';
import { answer, fakeApi, refuse, type FakeApi } from '#client/testing/fake-api.ts';
import {
  annotationOf,
  cellOf,
  draftOf,
  evaluationOf,
  mara,
  oda,
  revisionOf,
  spaceGroupOf,
} from '#client/testing/lattice-factories.ts';
import { renderAt } from '#client/testing/render-at.tsx';

// jsdom has no canvas; the stage has tests of its own.
vi.mock('#client/scene/viewer.tsx', () => ({ LatticeViewer: () => <div>stage</div> }));

const base = '/workspaces/kiln-lane';
const path = `${base}/lattices/${idOf(100)}`;
const page = `/w/kiln-lane/lattices/${idOf(100)}`;

function lattice(role: Role, revision: Partial<RevisionDetail> = {}): FakeApi {
  const head = revisionOf(revision);
  const name = 'Caesium chloride, trial 3';
  return fakeApi({
    'GET /session': answer(sessionState, sessionOf({ user: userOf(role) })),
    'GET /space-groups': answer(spaceGroupList, { items: [spaceGroupOf()] }),
    'GET /space-groups/1': answer(spaceGroupDetail, spaceGroupOf()),
    [`GET ${base}/lattices`]: answer(shelfPage, shelfOf([])),
    [`GET ${path}`]: answer(latticeSummary, latticeOf({ name, state: head.state })),
    [`GET ${path}/draft`]: answer(draft, draftOf()),
    [`GET ${path}/revisions`]: answer(revisionList, {
      items: [head, revisionOf({ id: idOf(401), number: 3, note: 'First guess.' })],
    }),
    [`GET ${path}/revisions/4`]: answer(revisionDetail, head),
    [`GET ${path}/revisions/3`]: answer(revisionDetail, revisionOf({ number: 3 })),
    [`GET ${path}/revisions/4/annotations`]: answer(annotationList, { items: [annotationOf()] }),
    [`GET ${path}/revisions/3/annotations`]: answer(annotationList, { items: [] }),
    [`GET ${path}/shares`]: answer(shareList, { items: [] }),
    [`POST ${base}/evaluations`]: answer(storedEvaluation, evaluationOf()),
    [`PUT ${path}/draft`]: (request) => {
      const { cell, method } = putDraftRequest.parse(request.body);
      return Response.json(
        draftOf({
          cell,
          method,
          etag: '"r4-v1"',
          isChanged: true,
          updatedAt: '2026-12-01T08:00:00Z',
          updatedBy: oda,
        }),
      );
    },
  });
}

describe('the lattice page', () => {
  it('shows what binds: total, ledger, title row', async () => {
    lattice('owner');
    renderAt(page);
    expect(await screen.findByRole('heading', { level: 1, name: /Caesium/ })).toBeInTheDocument();
    expect(await screen.findByRole('grid', { name: 'Pair ledger' })).toBeInTheDocument();
    expect(screen.getByText('revision 4')).toBeInTheDocument();
    expect(screen.getByText('caesium chloride')).toBeInTheDocument();
    expect(await screen.findByRole('link', { name: /Remarks/ })).toHaveTextContent('Remarks1');
  });

  it('keeps the selected row in the address', async () => {
    lattice('owner');
    const { user, address } = renderAt(page);
    const grid = await screen.findByRole('grid', { name: 'Pair ledger' });
    await user.click(within(grid).getAllByRole('row')[2]!);
    expect(new URLSearchParams(address().split('?')[1]).get('row')).toBe('Cs+1|Cs+1|4.120');
  });

  it('offers nothing to a reader that a reader may not do', async () => {
    lattice('reader');
    renderAt(`${page}?section=cell`);
    expect(await screen.findByLabelText('Cs1 x')).toHaveAttribute('readonly');
    for (const name of ['Share', 'Save revision', 'Submit for review', 'Rename', 'Undo']) {
      expect(screen.queryByRole('button', { name })).not.toBeInTheDocument();
    }
  });

  it('opens an older revision for reading, with a way back', async () => {
    lattice('owner');
    const { user, address } = renderAt(`${page}?section=history`);
    await user.click((await screen.findAllByRole('button', { name: 'Open' })).at(-1)!);
    expect(await screen.findByText(/It can be read, not changed/)).toBeInTheDocument();
    expect(address()).toContain('rev=3');
    await user.click(screen.getByRole('button', { name: 'To the draft' }));
    expect(address()).not.toContain('rev=');
  });
});

describe('the cell form', () => {
  it('puts what is wrong beside the field, and asks the server for nothing', async () => {
    const api = lattice('owner');
    const { user } = renderAt(`${page}?section=cell`);
    const field = await screen.findByLabelText('Cl1 x');
    await user.clear(field);
    await user.type(field, '1/+');
    await waitFor(() => expect(field).toHaveAttribute('aria-invalid', 'true'));
    expect(field).toHaveAccessibleDescription(/Cl1 x:/);
    expect(api.last(`POST ${base}/evaluations`)).toBeUndefined();
  });

  it('saves an edit as a draft on the version it was made on, and computes it', async () => {
    const api = lattice('owner');
    const { user } = renderAt(`${page}?section=cell`);
    const edge = await screen.findByLabelText(/^a, ångström/);
    await user.clear(edge);
    await user.type(edge, '4.2');
    expect(await screen.findByText(/Saved as draft/, {}, { timeout: 4_000 })).toBeInTheDocument();
    const put = api.last(`PUT ${path}/draft`);
    expect(put?.headers.get('if-match')).toBe('"r4-v0"');
    expect(put?.body).toMatchObject({ cell: { lattice: { a: '4.2' } } });
    await waitFor(() => expect(api.last(`POST ${base}/evaluations`)).toBeDefined());
    expect(screen.getByRole('button', { name: 'Save revision' })).toBeEnabled();
  });

  it('undoes and redoes with the keyboard', async () => {
    lattice('owner');
    const { user } = renderAt(`${page}?section=cell`);
    const edge = await screen.findByLabelText(/^a, ångström/);
    await user.clear(edge);
    await user.type(edge, '5');
    await user.keyboard('{Control>}z{/Control}');
    expect(edge).toHaveValue('4.12');
    await user.keyboard('{Control>}{Shift>}z{/Shift}{/Control}');
    expect(edge).toHaveValue('5');
  });

  it('locks what the crystal system ties together and says why', async () => {
    const api = lattice('owner', {
      cell: cellOf({ symmetry: { kind: 'setting', hallNumber: 517 } }),
    });
    const cubic = spaceGroupOf({
      hallNumber: 517,
      number: 221,
      symbol: 'P m -3 m',
      crystalSystem: 'cubic',
    });
    const cell = cellOf({ symmetry: { kind: 'setting', hallNumber: 517 } });
    api.on({
      'GET /space-groups/517': answer(spaceGroupDetail, cubic),
      [`GET ${path}/draft`]: answer(draft, draftOf({ cell })),
    });
    const { user } = renderAt(`${page}?section=cell`);
    const b = await screen.findByLabelText('b, ångström, = a, cubic');
    expect(b).toHaveAttribute('readonly');
    const edge = screen.getByLabelText(/^a, ångström/);
    await user.clear(edge);
    await user.type(edge, '6');
    expect(b).toHaveValue('6');
  });

  it('adds, duplicates and removes sites', async () => {
    lattice('owner');
    const { user } = renderAt(`${page}?section=cell`);
    await user.click(
      await screen.findByRole('button', { name: 'Site Cl1: duplicate, move, remove' }),
    );
    await user.click(await screen.findByRole('menuitem', { name: 'Duplicate' }));
    expect(screen.getByLabelText('Cl2 label')).toHaveValue('Cl2');
    await user.click(screen.getByRole('button', { name: 'Add a site' }));
    const element = screen.getByLabelText('X1 element');
    await user.type(element, 'K');
    expect(screen.getByLabelText('K1 label')).toHaveValue('K1');
    await user.click(screen.getByRole('button', { name: 'Site K1: duplicate, move, remove' }));
    await user.click(await screen.findByRole('menuitem', { name: 'Remove' }));
    expect(screen.queryByLabelText('K1 label')).not.toBeInTheDocument();
  });

  it('asks whose edit counts when someone else saved one', async () => {
    const api = lattice('owner');
    const { user } = renderAt(`${page}?section=cell`);
    const edge = await screen.findByLabelText(/^a, ångström/);
    const theirs = draftOf({
      cell: cellOf({ lattice: { ...cellOf().lattice, a: '4.3' } }),
      etag: '"r4-v9"',
      isChanged: true,
      updatedAt: '2026-12-01T08:00:00Z',
      updatedBy: mara,
    });
    api.on({
      [`PUT ${path}/draft`]: refuse('draft.conflict', { currentEtag: '"r4-v9"' }),
      [`GET ${path}/draft`]: answer(draft, theirs),
    });
    await user.clear(edge);
    await user.type(edge, '5');
    const dialog = await screen.findByRole('dialog', {}, { timeout: 4_000 });
    expect(dialog).toHaveTextContent('Mara Velt changed this draft too');
    expect(within(dialog).getByRole('row', { name: 'a 5 4.3' })).toBeInTheDocument();
    await user.click(within(dialog).getByRole('button', { name: 'Take theirs' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
    expect(screen.getByLabelText(/^a, ångström/)).toHaveValue('4.3');
  });
});

describe('review', () => {
  it('lets a reviewer return a revision, with a reason', async () => {
    const api = lattice('reviewer', { state: 'in_review', author: mara, submittedBy: mara });
    api.on({
      [`POST ${path}/revisions/4/return`]: answer(
        revisionDetail,
        revisionOf({ state: 'returned', decisionReason: 'Too short.' }),
      ),
    });
    const { user } = renderAt(page);
    await user.click(await screen.findByRole('button', { name: 'Return or accept' }));
    await user.click(await screen.findByRole('button', { name: 'Return' }));
    expect(await screen.findByText('Say why it goes back.')).toBeInTheDocument();
    await user.type(screen.getByLabelText('Reason'), 'Too short.');
    await user.click(screen.getByRole('button', { name: 'Return' }));
    expect(await screen.findByText('Revision 4 is returned.')).toBeInTheDocument();
    expect(api.last(`POST ${path}/revisions/4/return`)?.body).toEqual({ reason: 'Too short.' });
  });

  it('does not let an author accept their own where a second person is asked for', async () => {
    lattice('owner', { state: 'in_review', submittedBy: oda });
    const { user } = renderAt(page);
    await user.click(await screen.findByRole('button', { name: 'Return or accept' }));
    expect(await screen.findByRole('radio', { name: 'accept' })).toHaveAttribute(
      'aria-disabled',
      'true',
    );
    expect(screen.getByText(/someone other than the author/)).toBeInTheDocument();
  });

  it('pins a remark to the selected row', async () => {
    const api = lattice('reviewer');
    api.on({
      [`POST ${path}/revisions/4/annotations`]: answer(annotation, annotationOf({ number: 2 })),
    });
    const { user } = renderAt(
      `${page}?section=remarks&row=${encodeURIComponent('Cs+1|Cl-1|3.568')}`,
    );
    expect(await screen.findByText('Is this edge from the warm run?')).toBeInTheDocument();
    await user.type(
      screen.getByLabelText('New remark on Cs⁺ – Cl⁻ at 3.568 Å'),
      'Longer than the radii say.',
    );
    await user.click(screen.getByRole('button', { name: 'Pin remark' }));
    await waitFor(() =>
      expect(api.last(`POST ${path}/revisions/4/annotations`)?.body).toEqual({
        anchor: { kind: 'pair', key: 'Cs+1|Cl-1|3.568' },
        text: 'Longer than the radii say.',
      }),
    );
  });

  it('replies to and resolves a remark', async () => {
    const api = lattice('reviewer');
    const remark = `${path}/annotations/${idOf(500)}`;
    api.on({
      [`POST ${remark}/replies`]: answer(annotation, annotationOf()),
      [`POST ${remark}/resolve`]: answer(annotation, annotationOf()),
    });
    const { user } = renderAt(`${page}?section=remarks`);
    await user.click(await screen.findByRole('button', { name: 'Reply' }));
    await user.type(screen.getByLabelText('Reply'), 'From the cold one.');
    await user.click(screen.getByRole('button', { name: 'Reply' }));
    await waitFor(() =>
      expect(api.last(`POST ${remark}/replies`)?.body).toEqual({ text: 'From the cold one.' }),
    );
    await user.click(await screen.findByRole('button', { name: 'Resolve' }));
    await waitFor(() => expect(api.last(`POST ${remark}/resolve`)).toBeDefined());
  });
});

describe('sharing', () => {
  it('shows a new link this once', async () => {
    const api = lattice('owner');
    api.on({
      [`POST ${path}/revisions/4/shares`]: answer(createdShare, {
        id: idOf(600),
        revisionNumber: 4,
        createdBy: oda,
        createdAt: '2026-12-01T08:00:00Z',
        expiresAt: null,
        revokedAt: null,
        openedCount: 0,
        lastOpenedAt: null,
        token: 'T'.repeat(43),
      }),
    });
    const { user } = renderAt(page);
    await user.click(await screen.findByRole('button', { name: 'Share' }));
    await user.click(await screen.findByRole('button', { name: 'Create a link' }));
    expect(await screen.findByLabelText('Link')).toHaveValue(
      `${window.location.origin}/s/${'T'.repeat(43)}`,
    );
    expect(api.last(`POST ${path}/revisions/4/shares`)?.body).toEqual({ expiresInDays: 30 });
  });
});
