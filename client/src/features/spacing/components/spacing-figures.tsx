import type { JSX, ReactNode } from 'react';

import type { EnergeticsAccount } from '#common/physics/energetics/energetics-account';
import type { EnergeticModel, ValueRange } from '#common/schemas/energetics';
import { EV_IN_KJ_PER_MOL } from '#common/units/constants';
import { formatFixed, formatSigned } from '#common/units/format';
import { CopyButton } from '#client/components/copy-button.tsx';
import { EnergyUnitSwitch } from '#client/components/energy-unit-switch.tsx';
import type { EnergyScale } from '#client/lib/energy-unit.ts';

interface SpacingFiguresProps {
  account: EnergeticsAccount;
  model: EnergeticModel;
  scale: EnergyScale;
}

/** A range with its decimals; one number where both ends read the same. */
function written({ low, high }: ValueRange, decimals: number, factor = 1): string {
  const [from, to] = [formatFixed(low * factor, decimals), formatFixed(high * factor, decimals)];
  return from === to ? from : `${from} … ${to}`;
}

const middle = ({ low, high }: ValueRange): number => (low + high) / 2;

/** How far the model is off, in per cent of the measured value. */
function deviation(model: ValueRange, measured: ValueRange): string {
  return `${formatSigned((middle(model) / middle(measured) - 1) * 100, 1)} %`;
}

function Figure({
  value,
  unit,
  children,
}: {
  value: string;
  unit: string;
  children: ReactNode;
}): JSX.Element {
  return (
    <div>
      <dd className="font-medium">
        {value} <span className="font-normal text-soft">{unit}</span>
      </dd>
      <dt className="text-small text-soft">{children}</dt>
    </div>
  );
}

function Compared({ account, model, scale }: SpacingFiguresProps): JSX.Element | null {
  const { latticeEnergyKjPerMol: energy, bulkModulusGpa: stiffness } = account;
  const { measured } = model;
  const parts: string[] = [];
  if (measured.latticeEnergyKjPerMol !== null && energy !== null) {
    const value = written(measured.latticeEnergyKjPerMol, scale.decimals, 1 / scale.kjPerMol);
    parts.push(
      `measured ${value} ${scale.unit}: the model is ${deviation(energy, measured.latticeEnergyKjPerMol)} off`,
    );
  }
  if (measured.bulkModulusGpa !== null && stiffness !== null) {
    parts.push(
      `measured bulk modulus ${written(measured.bulkModulusGpa, 1)} GPa: the model is ${deviation(stiffness, measured.bulkModulusGpa)} off`,
    );
  }
  return parts.length === 0 ? null : (
    <p className="mt-3 text-small text-soft">
      {parts.join('; ')}
      {measured.source !== '' && ` (${measured.source})`}.
    </p>
  );
}

/** Lattice energy on top, what else the model says below it. */
export function SpacingFigures(props: SpacingFiguresProps): JSX.Element {
  const { account, scale } = props;
  const { latticeEnergyKjPerMol, bondEnergyEv, equilibriumSpacingA, bulkModulusGpa } = account;
  const { hardness, kapustinskii } = account;
  const energy = written(latticeEnergyKjPerMol!, scale.decimals, 1 / scale.kjPerMol);
  return (
    <div className="mb-5">
      <div className="flex flex-wrap items-start justify-between gap-3">
        <p className="text-figure leading-none font-bold tracking-[-0.02em]">
          {energy}{' '}
          <span className="text-lead font-normal tracking-normal text-soft">
            {scale.unit} lattice energy
          </span>
          <CopyButton text={`${energy} ${scale.unit}`} label="Copy the lattice energy" />
        </p>
        <EnergyUnitSwitch />
      </div>
      <p className="mt-1.5 text-small text-soft">
        model value at 0 K · gas ions to crystal, per formula unit · uniform scaling of the cell
      </p>
      <dl className="mt-3.5 grid grid-cols-[repeat(auto-fit,minmax(9.2rem,1fr))] gap-x-6 gap-y-2.5">
        <Figure value={written(equilibriumSpacingA!, 3)} unit="Å">
          r₀, spacing at rest; now {formatFixed(account.spacingA, 3)} Å
        </Figure>
        <Figure value={written(bulkModulusGpa!, 1)} unit="GPa">
          bulk modulus at rest
        </Figure>
        <Figure
          value={written(bondEnergyEv!, scale.decimals, EV_IN_KJ_PER_MOL / scale.kjPerMol)}
          unit={scale.unit}
        >
          bond energy, depth of the well
        </Figure>
        {hardness !== null && (
          <Figure
            value={written(hardness.range, hardness.symbol === 'n' ? 2 : 4)}
            unit={hardness.unit}
          >
            {hardness.symbol}, {hardness.source}
          </Figure>
        )}
        <Figure
          value={
            kapustinskii.energyKjPerMol === null
              ? '–'
              : formatFixed(kapustinskii.energyKjPerMol / scale.kjPerMol, scale.decimals)
          }
          unit={kapustinskii.energyKjPerMol === null ? '' : scale.unit}
        >
          {kapustinskii.reason ??
            `Kapustinskii’s estimate${kapustinskii.isGeneralised ? ', generalised' : ''} from radii of ${formatFixed(kapustinskii.radiusSumA ?? 0, 2)} Å`}
        </Figure>
      </dl>
      <Compared {...props} />
    </div>
  );
}
