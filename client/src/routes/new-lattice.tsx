import { lazy, Suspense, type JSX } from 'react';
import { useSearchParams } from 'react-router-dom';

import type { CellDefinition } from '#common/schemas/cell';
import { EmptyState } from '#client/components/empty-state.tsx';
import { Page, PageHeader } from '#client/components/page.tsx';
import { SectionTabs } from '#client/components/section-tabs.tsx';
import { Skeleton } from '#client/components/skeleton.tsx';
import { StartBlank } from '#client/features/lattices/components/start-blank.tsx';
import { StartFromCif } from '#client/features/lattices/components/start-from-cif.tsx';
import { StartFromPrototype } from '#client/features/lattices/components/start-from-prototype.tsx';
import { useCan } from '#client/lib/session.ts';

const starts = ['prototype', 'cif', 'blank'] as const;
const words = { prototype: 'Structure type', cif: 'CIF', blank: 'Blank cell' } as const;

const CellPreview = lazy(async () => {
  const { CellPreview: Preview } = await import('#client/routes/lattice-page/cell-preview.tsx');
  return { default: Preview };
});

const preview = (cell: CellDefinition): JSX.Element => (
  <Suspense fallback={<Skeleton className="h-80 opacity-50" />}>
    <CellPreview cell={cell} />
  </Suspense>
);

/** `/w/:workspace/new`: from a structure type, a file, or nothing, to a lattice of one's own. */
export function Component(): JSX.Element {
  const can = useCan();
  const [params, setParams] = useSearchParams();
  const start = starts.find((one) => one === params.get('from')) ?? 'prototype';
  if (!can('lattice.create')) {
    return (
      <Page title="New lattice">
        <h1 className="sr-only">New lattice</h1>
        <EmptyState title="Your role does not create lattices">
          Owners and crystallographers of the workspace may.
        </EmptyState>
      </Page>
    );
  }
  return (
    <Page title="New lattice">
      <PageHeader title="New lattice" />
      <SectionTabs
        label="Ways to start"
        className="mt-3.5 mb-6"
        current={start}
        sections={starts.map((key) => ({
          key,
          label: words[key],
          to: { search: key === 'prototype' ? '' : `from=${key}` },
        }))}
      />
      {start === 'prototype' && (
        <StartFromPrototype
          chosen={params.get('type')}
          onChoose={(type) => setParams({ type }, { replace: true, preventScrollReset: true })}
          preview={preview}
        />
      )}
      {start === 'cif' && <StartFromCif preview={preview} />}
      {start === 'blank' && <StartBlank />}
    </Page>
  );
}
