import { Problem } from '#common/errors/problem';

/**
 * The version of what the draft of a lattice says: the revision it goes out from and its count,
 * 0 while nothing is edited.
 */
export const draftEtag = (baseRevision: number, version: number): string =>
  `"r${baseRevision}-v${version}"`;

/** Whether an If-Match header names the version. */
export const matchesEtag = (ifMatch: string, etag: string): boolean =>
  ifMatch.split(',').some((one) => one.trim() === etag);

/**
 * The If-Match header of a request that must have one.
 * @throws {Problem} `request.if_match_missing`
 */
export function requireIfMatch(ifMatch: string | undefined): string {
  if (ifMatch === undefined || ifMatch.trim() === '') {
    throw new Problem('request.if_match_missing');
  }
  return ifMatch;
}

/** The failure of a request that goes out from another version. */
export const draftConflict = (currentEtag: string): Problem =>
  new Problem('draft.conflict', undefined, { currentEtag });
