import { useMemo, type JSX, type ReactNode } from 'react';
import { useLocation } from 'react-router-dom';

import type { Annotation } from '#common/schemas/review';
import { Button } from '#client/components/button.tsx';
import { EmptyState } from '#client/components/empty-state.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { SectionTabs, type Section } from '#client/components/section-tabs.tsx';
import { Skeleton } from '#client/components/skeleton.tsx';
import type { ResolvedState } from '#client/features/cell-editor/hooks/use-resolved-cell.ts';
import { EnergyDetails } from '#client/features/electrostatics/components/energy-details.tsx';
import { EnergyPanel } from '#client/features/electrostatics/components/energy-panel.tsx';
import type { LiveEvaluation } from '#client/features/electrostatics/hooks/use-live-evaluation.ts';
import { pickedIons, type PickedIon } from '#client/features/electrostatics/model/picked-ions.ts';
import {
  writeLatticeAddress,
  type LatticeAddress,
  type SectionKey,
} from '#client/features/lattices/hooks/use-lattice-address.ts';
import { remarksByPair } from '#client/features/review/model/anchors.ts';
import {
  Checks,
  energeticsPanel,
  type EnergeticsInput,
} from '#client/routes/lattice-page/energetics-panel.tsx';
import { SitesPanel } from '#client/routes/lattice-page/sites-panel.tsx';
import { StagePanel } from '#client/routes/lattice-page/stage-panel.tsx';

export interface LatticeScreenProps {
  header: ReactNode;
  /** Above the sections: an older revision, a reason for return. */
  banner?: ReactNode;
  resolved: ResolvedState;
  live: LiveEvaluation;
  address: LatticeAddress;
  update: (change: Partial<LatticeAddress>) => void;
  annotations: readonly Annotation[];
  energetics: EnergeticsInput;
  /** Sections in their order; energy and sites are drawn here, the others are given. */
  sections: readonly SectionKey[];
  panels: Partial<Record<SectionKey, ReactNode>>;
  mayRemark: boolean;
}

const words: Record<SectionKey, string> = {
  cell: 'Cell',
  energy: 'Energy',
  spacing: 'Spacing',
  formation: 'Formation',
  checks: 'Checks',
  sites: 'Sites',
  remarks: 'Remarks',
  history: 'History',
};

function useSections({ sections, annotations }: LatticeScreenProps): readonly Section[] {
  const { search } = useLocation();
  const open = annotations.filter((annotation) => annotation.resolvedAt === null).length;
  return sections.map((key) => ({
    key,
    label: words[key],
    to: { search: writeLatticeAddress(new URLSearchParams(search), { section: key }).toString() },
    ...(key === 'remarks' ? { count: open } : {}),
  }));
}

function StageColumn(props: LatticeScreenProps): JSX.Element {
  const { resolved, live, address, update, annotations } = props;
  if (resolved.shown !== null && resolved.shown.sites.length > 0) {
    return (
      <StagePanel
        cell={resolved.shown}
        result={live.evaluation?.result ?? null}
        address={address}
        update={update}
        annotations={annotations}
        pickedActions={
          <>
            {address.section !== 'sites' && (
              <Button size="small" variant="quiet" onClick={() => update({ section: 'sites' })}>
                Shells
              </Button>
            )}
            {props.mayRemark && address.section !== 'remarks' && (
              <Button size="small" variant="quiet" onClick={() => update({ section: 'remarks' })}>
                Remark
              </Button>
            )}
          </>
        }
      />
    );
  }
  if (resolved.error !== null) {
    return <ErrorState error={resolved.error} onRetry={resolved.retry} />;
  }
  if (resolved.isLoading) {
    return <Skeleton className="m-8 h-[calc(100%-4rem)]" />;
  }
  return (
    <EmptyState title="Nothing to show yet">
      The lattice appears here once its cell can be read: edges, angles and at least one site.
    </EmptyState>
  );
}

/** In place of the numbers while the cell itself can't be read. */
function Unreadable(props: LatticeScreenProps): JSX.Element {
  if (props.resolved.isLoading) {
    return <div className="min-h-96" />;
  }
  const count = props.resolved.problems.length;
  return (
    <EmptyState
      title="No energy yet"
      action={
        props.address.section === 'cell' ? undefined : (
          <Button onClick={() => props.update({ section: 'cell' })}>To the cell</Button>
        )
      }
    >
      {count > 0
        ? props.resolved.problems
            .slice(0, 3)
            .map((problem) => problem.message)
            .join(' ')
        : 'Nothing has been computed for this cell.'}
    </EmptyState>
  );
}

function Panel(props: LatticeScreenProps & { picked: readonly PickedIon[] }): JSX.Element {
  const { address, update, live, resolved, picked } = props;
  const remarks = useMemo(() => remarksByPair(props.annotations), [props.annotations]);
  const given = props.panels[address.section];
  if (given !== undefined) {
    return <>{given}</>;
  }
  const result = live.problem === null ? live.evaluation?.result : undefined;
  const isKnown = result !== undefined || live.problem !== null;
  if (address.section === 'checks' && resolved.cell !== null && isKnown) {
    return (
      <Checks
        cell={resolved.cell}
        result={result ?? null}
        problem={live.problem?.message ?? null}
        energetics={props.energetics}
      />
    );
  }
  if (result !== undefined && resolved.cell !== null) {
    const { energetics, update: change } = props;
    const { section } = address;
    const at = { section, cell: resolved.cell, result, energetics, address, update: change };
    const panel = energeticsPanel(at);
    if (panel !== null) {
      return panel;
    }
  }
  if (address.section === 'sites' && result !== undefined) {
    return (
      <SitesPanel
        cell={resolved.cell}
        result={result}
        picked={picked}
        row={address.row}
        reachA={address.reachA}
        onPick={(ids) => update({ picked: ids })}
        onRow={(row) => update({ row })}
      />
    );
  }
  return (
    <EnergyPanel
      live={live}
      fallback={<Unreadable {...props} />}
      problemAction={<Button onClick={() => update({ section: 'cell' })}>To the cell</Button>}
      cell={resolved.cell}
      choice={{ reachA: address.reachA, view: address.view }}
      onChoice={({ reachA, view }) => update({ reachA, view })}
      picked={picked}
      selectedKey={address.row}
      onSelect={(row) => update({ row })}
      remarksByKey={remarks}
    />
  );
}

/** Title, sections, stage left and the section's panel right; one under the other where it is narrow. */
export function LatticeScreen(props: LatticeScreenProps): JSX.Element {
  const { address, resolved, live } = props;
  const sections = useSections(props);
  const picked = useMemo(
    () => (resolved.shown === null ? [] : pickedIons(resolved.shown, address.picked)),
    [resolved.shown, address.picked],
  );
  return (
    <>
      {props.header}
      {props.banner}
      <SectionTabs
        label="Sections"
        sections={sections}
        current={address.section}
        className="mt-3.5"
      />
      <div className="wide:grid wide:grid-cols-[minmax(0,1fr)_minmax(32.5rem,41%)]">
        <div className="h-[min(72dvh,34rem)] border-b border-line md:h-[min(66dvh,44rem)] wide:sticky wide:top-14 wide:h-[max(30rem,calc(100dvh-11.75rem))] wide:border-r wide:border-b-0">
          <StageColumn {...props} />
        </div>
        <div className="min-w-0 pt-5 wide:pl-7">
          <Panel {...props} picked={picked} />
        </div>
      </div>
      {address.section === 'energy' && live.evaluation !== null && live.problem === null && (
        <div className="mt-6">
          <EnergyDetails result={live.evaluation.result} />
        </div>
      )}
    </>
  );
}
