import { useCallback, useMemo, type JSX, type ReactNode } from 'react';

import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationResult } from '#common/schemas/evaluation';
import type { Annotation } from '#common/schemas/review';
import { formatFixed } from '#common/units/format';
import { speciesText } from '#client/components/chem/species-key.ts';
import { PickedBar } from '#client/features/electrostatics/components/picked-bar.tsx';
import { pickedIons, pickedPair } from '#client/features/electrostatics/model/picked-ions.ts';
import type { LatticeAddress } from '#client/features/lattices/hooks/use-lattice-address.ts';
import { anchorWords, parsePairKey } from '#client/features/review/model/anchors.ts';
import { useTheme } from '#client/lib/theme.ts';
import { speciesRadiusA } from '#client/routes/lattice-page/ion-radii.ts';
import { useStageSettings } from '#client/routes/lattice-page/stage-settings.ts';
import { parseIonId } from '#client/scene/model/ion-id.ts';
import type { LatticeViewerProps } from '#client/scene/viewer-props.ts';
import { LatticeViewer } from '#client/scene/viewer.tsx';

interface StagePanelProps {
  cell: ResolvedCell;
  result: EvaluationResult | null;
  address: LatticeAddress;
  update: (change: Partial<LatticeAddress>) => void;
  annotations: readonly Annotation[];
  /** Buttons beside what is picked. */
  pickedActions?: ReactNode;
}

function pinsOf(annotations: readonly Annotation[]): LatticeViewerProps['pins'] {
  return annotations.map(({ id, number, anchor, resolvedAt, text }) => ({
    id,
    number,
    siteLabel: anchor.kind === 'site' ? anchor.label : null,
    pair: anchor.kind === 'pair' ? parsePairKey(anchor.key) : null,
    isResolved: resolvedAt !== null,
    summary: `${anchorWords(anchor)}: ${text.slice(0, 140)}`,
  }));
}

/** Title and detail of the tag that names an ion. */
function useDescribeIon(
  cell: ResolvedCell,
  result: EvaluationResult | null,
): LatticeViewerProps['describeIon'] {
  return useCallback(
    (ionId) => {
      const site = cell.sites[parseIonId(ionId)?.siteIndex ?? -1];
      if (site === undefined) {
        return { title: ionId, detail: '' };
      }
      const felt = result?.sites.find((one) => one.label === site.label);
      const potential = felt === undefined ? '' : `φ ${formatFixed(felt.potentialV, 2)} V`;
      return {
        title: `${site.label}`,
        detail: [speciesText(site.speciesKey), potential].filter((one) => one !== '').join('  '),
      };
    },
    [cell, result],
  );
}

/** The stage with what is picked in it under it. */
export function StagePanel(props: StagePanelProps): JSX.Element {
  const { cell, result, address, update, annotations } = props;
  const theme = useTheme();
  const [settings, changeSettings] = useStageSettings();
  const picked = useMemo(() => pickedIons(cell, address.picked), [cell, address.picked]);
  const pins = useMemo(() => pinsOf(annotations), [annotations]);
  const litPair = useMemo(
    () => (address.row === null ? null : parsePairKey(address.row)),
    [address.row],
  );
  const describeIon = useDescribeIon(cell, result);
  const [one, other] = picked;
  const pair =
    one === undefined || other === undefined
      ? null
      : pickedPair(cell, one, other, result?.pairLedger ?? null);
  return (
    <div className="flex h-full min-h-0 flex-col">
      <div className="min-h-0 grow">
        <LatticeViewer
          cell={cell}
          ionicRadiusA={speciesRadiusA}
          selectedIonIds={address.picked}
          onSelectionChange={(ids) => update({ picked: ids.slice(-8) })}
          litPair={litPair}
          pins={pins}
          onPinClick={(id) =>
            update({
              section: 'remarks',
              remark: annotations.find((annotation) => annotation.id === id)?.number ?? null,
            })
          }
          repeat={address.repeat}
          onRepeatChange={(repeat) => update({ repeat })}
          ionScale={settings.ionScale}
          onIonScaleChange={(ionScale) => changeSettings({ ionScale })}
          signMarks={settings.signMarks}
          onSignMarksChange={(signMarks) => changeSettings({ signMarks })}
          view={address.camera}
          onViewChange={(camera) => update({ camera })}
          describeIon={describeIon}
          theme={theme}
        />
      </div>
      <PickedBar
        picked={picked}
        pair={pair}
        result={result}
        onClear={() => update({ picked: [] })}
        actions={props.pickedActions}
      />
    </div>
  );
}
