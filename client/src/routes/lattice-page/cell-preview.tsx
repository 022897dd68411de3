import { useState, type JSX } from 'react';

import type { CellDefinition } from '#common/schemas/cell';
import { speciesText } from '#client/components/chem/species-key.ts';
import { Skeleton } from '#client/components/skeleton.tsx';
import { LiveNumbers } from '#client/features/cell-editor/components/live-numbers.tsx';
import { useResolvedCell } from '#client/features/cell-editor/hooks/use-resolved-cell.ts';
import { useTheme } from '#client/lib/theme.ts';
import { speciesRadiusA } from '#client/routes/lattice-page/ion-radii.ts';
import { useStageSettings } from '#client/routes/lattice-page/stage-settings.ts';
import { parseIonId } from '#client/scene/model/ion-id.ts';
import { LatticeViewer } from '#client/scene/viewer.tsx';

/** A cell before it is created: what it looks like and what follows from it. */
export function CellPreview({ cell }: { cell: CellDefinition }): JSX.Element {
  const theme = useTheme();
  const [settings] = useStageSettings();
  const [picked, setPicked] = useState<readonly string[]>([]);
  const { shown, problems } = useResolvedCell(cell);
  if (shown === null) {
    return problems.length === 0 ? (
      <Skeleton className="h-80 opacity-50" />
    ) : (
      <p className="text-fails">{problems[0]?.message}</p>
    );
  }
  return (
    <div className="grid gap-3">
      <LiveNumbers cell={shown} isStale={false} />
      <div className="h-80 rounded-control border border-line">
        <LatticeViewer
          cell={shown}
          ionicRadiusA={speciesRadiusA}
          selectedIonIds={picked}
          onSelectionChange={setPicked}
          litPair={null}
          pins={[]}
          repeat={[1, 1, 1]}
          ionScale={settings.ionScale}
          signMarks={settings.signMarks}
          view={null}
          describeIon={(id) => {
            const site = shown.sites[parseIonId(id)?.siteIndex ?? -1];
            return site === undefined
              ? { title: id, detail: '' }
              : { title: site.label, detail: speciesText(site.speciesKey) };
          }}
          theme={theme}
        />
      </div>
    </div>
  );
}
