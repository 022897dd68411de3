import type { Draft } from '#common/schemas/lattice';
import { presentPerson } from '#server/users/person.presenter';

import type { DraftState } from './drafts.repository.js';
import { etagOf } from './drafts.service.js';

export function presentDraft(state: DraftState): Draft {
  const { draft, head, updatedBy } = state;
  const { cell, method, model } = (draft ?? head)!;
  return {
    latticeId: state.latticeId,
    etag: etagOf(state),
    baseRevision: draft?.baseRevision ?? state.headRevision,
    isChanged: draft !== null,
    cell,
    method,
    model,
    prototype: state.prototype,
    updatedAt: draft?.updatedAt.toISOString() ?? null,
    updatedBy: updatedBy && presentPerson(updatedBy),
  };
}
