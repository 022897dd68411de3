import type { JSX } from 'react';

import { Segmented } from '#client/components/segmented.tsx';
import { energyScales, setEnergyUnit, useEnergyScale } from '#client/lib/energy-unit.ts';

const options = Object.values(energyScales).map(({ unit }) => ({ value: unit, label: unit }));

/** The unit of energies, remembered on this device. */
export function EnergyUnitSwitch(): JSX.Element {
  const { unit } = useEnergyScale();
  return (
    <Segmented label="Unit of energies" options={options} value={unit} onChange={setEnergyUnit} />
  );
}
