import { useQuery } from '@tanstack/react-query';
import { Download, Printer } from 'lucide-react';
import type { JSX } from 'react';
import { useParams, useSearchParams } from 'react-router-dom';

import type { LatticeReport } from '#common/schemas/report';
import { Button, ButtonLink } from '#client/components/button.tsx';
import { FormulaText } from '#client/components/chem/formula-text.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { NotFoundState } from '#client/components/not-found-state.tsx';
import { Page } from '#client/components/page.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { reportPdfAddress, reportQuery } from '#client/features/report/api/report.ts';
import { ReportDrawing } from '#client/features/report/components/report-picture.tsx';
import { ReportSections } from '#client/features/report/components/report-sections.tsx';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';
import { formatExact } from '#client/lib/relative-age.ts';

function Opening({ report }: { report: LatticeReport }): JSX.Element {
  return (
    <div className="mt-4 grid gap-6 md:grid-cols-[minmax(0,1fr)_18rem] print:grid-cols-[minmax(0,1fr)_14rem]">
      <div>
        <h1 className="text-title tracking-[-0.02em]">{report.title}</h1>
        {report.formula !== null && (
          <p className="mt-1 text-lead">
            <FormulaText formula={report.formula} />
          </p>
        )}
        <p className="mt-4">
          Revision {report.revision} by {report.author}, {report.workspaceName}
        </p>
        <p>Saved {formatExact(report.savedAt)}</p>
        <p>{report.review}</p>
        {report.contentHash !== null && (
          <p className="mt-3 text-small text-soft">Content hash (SHA-256) {report.contentHash}</p>
        )}
        {report.address !== null && <p className="text-small text-soft">{report.address}</p>}
        <p className="text-small text-soft">Report made {formatExact(report.madeAt)}</p>
      </div>
      {report.picture !== null && <ReportDrawing picture={report.picture} />}
    </div>
  );
}

function Content({
  latticeRef,
  revision,
}: {
  latticeRef: LatticeRef;
  revision: number;
}): JSX.Element {
  const query = useQuery(reportQuery(latticeRef, revision));
  if (query.isPending) {
    return (
      <>
        <h1 className="sr-only">Report</h1>
        <SkeletonLines lines={8} />
      </>
    );
  }
  if (query.isError) {
    return (
      <>
        <h1 className="sr-only">Report</h1>
        <ErrorState error={query.error} onRetry={() => void query.refetch()} />
      </>
    );
  }
  return (
    <>
      <Opening report={query.data} />
      <ReportSections sections={query.data.sections} />
    </>
  );
}

/** `/w/:workspace/lattices/:lattice/report?rev=n`: a revision on paper. */
export function Component(): JSX.Element {
  const { workspace = '', lattice = '' } = useParams();
  const [search] = useSearchParams();
  const revision = Number(search.get('rev'));
  const latticeRef = { workspace, latticeId: lattice };
  if (!Number.isInteger(revision) || revision < 1) {
    return (
      <>
        <h1 className="sr-only">Not found</h1>
        <NotFoundState />
      </>
    );
  }
  return (
    <Page title="Report" width="reading">
      <div className="flex flex-wrap gap-2 print:hidden">
        <ButtonLink variant="quiet" to={`/w/${workspace}/lattices/${lattice}?rev=${revision}`}>
          Back to the revision
        </ButtonLink>
        <span className="flex gap-2 md:ml-auto">
          <Button onClick={() => window.print()}>
            <Printer aria-hidden className="size-4" /> Print
          </Button>
          <ButtonLink to={reportPdfAddress(latticeRef, revision)} reloadDocument download>
            <Download aria-hidden className="size-4" /> PDF
          </ButtonLink>
        </span>
      </div>
      <Content latticeRef={latticeRef} revision={revision} />
    </Page>
  );
}
