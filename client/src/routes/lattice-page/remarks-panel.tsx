import type { JSX } from 'react';

import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { Annotation, AnnotationAnchor } from '#common/schemas/review';
import { pickedIons } from '#client/features/electrostatics/model/picked-ions.ts';
import type { LatticeAddress } from '#client/features/lattices/hooks/use-lattice-address.ts';
import { RemarksSection } from '#client/features/review/components/remarks-section.tsx';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';
import { frontIonId } from '#client/routes/lattice-page/front-ion.ts';

interface RemarksPanelProps {
  latticeRef: LatticeRef;
  revision: number;
  cell: ResolvedCell | null;
  address: LatticeAddress;
  update: (change: Partial<LatticeAddress>) => void;
}

/** What a new remark can be pinned to right now, the most particular first. */
function anchorsOf(cell: ResolvedCell | null, address: LatticeAddress): AnnotationAnchor[] {
  const picked = cell === null ? [] : pickedIons(cell, address.picked);
  const labels = [...new Set(picked.map((ion) => ion.site.label))];
  return [
    ...labels.map((label) => ({ kind: 'site' as const, label })),
    ...(address.row === null ? [] : [{ kind: 'pair' as const, key: address.row }]),
    { kind: 'revision' },
  ];
}

/** Remarks, tied to what is picked in the stage and selected in the ledger. */
export function RemarksPanel(props: RemarksPanelProps): JSX.Element {
  const { cell, address, update } = props;
  const show = ({ anchor, number }: Annotation): void => {
    if (anchor.kind === 'pair') {
      update({ remark: number, row: anchor.key, picked: [] });
    } else if (anchor.kind === 'site') {
      const id = cell === null ? null : frontIonId(cell, anchor.label);
      update({ remark: number, picked: id === null ? [] : [id] });
    }
  };
  return (
    <RemarksSection
      latticeRef={props.latticeRef}
      revision={props.revision}
      anchors={anchorsOf(cell, address)}
      current={address.remark}
      onShow={show}
    />
  );
}
