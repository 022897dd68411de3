import { queryOptions } from '@tanstack/react-query';

import { latticeReport } from '#common/schemas/report';
import { api, apiAddress } from '#client/lib/api-client.ts';
import { latticeKey, latticePath, type LatticeRef } from '#client/lib/lattice-keys.ts';

const path = (ref: LatticeRef, revision: number): string =>
  `${latticePath(ref)}/revisions/${revision}/report`;

/** The report of a revision; made anew each time, since remarks and review move on. */
export const reportQuery = (ref: LatticeRef, revision: number) =>
  queryOptions({
    queryKey: [...latticeKey(ref), 'report', revision],
    queryFn: ({ signal }) => api.get(path(ref, revision), { schema: latticeReport, signal }),
    staleTime: 0,
  });

/** Where the PDF is. */
export const reportPdfAddress = (ref: LatticeRef, revision: number): string =>
  apiAddress(`${path(ref, revision)}.pdf`);

/** Where the PDF is that a link holder gets. */
export const sharedReportAddress = (token: string): string =>
  apiAddress(`/shares/${token}/report.pdf`);
