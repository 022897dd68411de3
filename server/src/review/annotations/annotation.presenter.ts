import type { Annotation, AnnotationAnchor } from '#common/schemas/review';
import { presentPerson } from '#server/users/person.presenter';

import type { AnnotationFullRow } from './annotations.repository.js';

function presentAnchor({ anchorKind, anchorTarget }: AnnotationFullRow): AnnotationAnchor {
  switch (anchorKind) {
    case 'revision':
      return { kind: 'revision' };
    case 'site':
      return { kind: 'site', label: anchorTarget ?? '' };
    case 'pair':
      return { kind: 'pair', key: anchorTarget ?? '' };
  }
}

export const presentAnnotation = (row: AnnotationFullRow): Annotation => ({
  id: row.id,
  number: row.number,
  revisionNumber: row.revisionNumber,
  anchor: presentAnchor(row),
  text: row.text,
  author: presentPerson(row.author),
  createdAt: row.createdAt.toISOString(),
  resolvedAt: row.resolvedAt?.toISOString() ?? null,
  resolvedBy: row.resolvedBy && presentPerson(row.resolvedBy),
  replies: row.replies.map(({ id, author, text, createdAt }) => ({
    id,
    author: presentPerson(author),
    text,
    createdAt: createdAt.toISOString(),
  })),
});
