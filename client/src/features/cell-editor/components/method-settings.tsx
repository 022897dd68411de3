import type { JSX } from 'react';

import type { EvaluationMethod } from '#common/schemas/cell';
import { formatPower } from '#common/units/format';
import { SelectField, type SelectOption } from '#client/components/select-field.tsx';
import { SwitchField } from '#client/components/switch-field.tsx';

interface MethodSettingsProps {
  method: EvaluationMethod;
  isReadOnly: boolean;
  onChange: (method: EvaluationMethod) => void;
}

const tolerances = [1e-4, 1e-6, 1e-8, 1e-10, 1e-12, 1e-13] as const;

function optionsFor(current: number): SelectOption<string>[] {
  const all = tolerances.some((one) => one === current)
    ? tolerances
    : [...tolerances, current].toSorted((one, other) => other - one);
  return all.map((value) => ({
    value: String(value),
    label: formatPower(value, Number.isInteger(Math.log10(value)) ? 1 : 2),
  }));
}

/** How the energy is summed. */
export function MethodSettings({ method, isReadOnly, onChange }: MethodSettingsProps): JSX.Element {
  return (
    <section aria-labelledby="method-title" className="grid gap-3">
      <h2 id="method-title" className="font-bold">
        Method
      </h2>
      <SelectField
        label="Tolerance"
        hint="Largest error of the energy, relative to Σq²/d₀."
        options={optionsFor(method.toleranceRelative)}
        value={String(method.toleranceRelative)}
        disabled={isReadOnly}
        onChange={(value) => onChange({ ...method, toleranceRelative: Number(value) })}
        className="max-w-64"
      />
      <SwitchField
        label="Uniform background"
        hint="For charged cells only: spreads the opposite charge evenly. Every number then carries that mark."
        isOn={method.uniformBackground}
        disabled={isReadOnly}
        onChange={(uniformBackground) => onChange({ ...method, uniformBackground })}
      />
    </section>
  );
}
