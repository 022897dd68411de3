import { Fragment, type JSX } from 'react';

import type { DataKey } from '#common/chemistry/data-key';
import { formatCharge } from '#common/units/format';
import { FormulaText } from '#client/components/chem/formula-text.tsx';
import { subjectOf } from '#client/features/data-values/model/subject.ts';

/** What a value is of, set as chemists write it: Na⁺ – O²⁻, SO₄²⁻. */
export function SubjectText({ of }: { of: DataKey }): JSX.Element {
  const { formulas, detail } = subjectOf(of);
  return (
    <span>
      <span className="font-medium">
        {formulas.map(({ formula, chargeE }, index) => (
          <Fragment key={`${formula}${chargeE}`}>
            {index > 0 && ' – '}
            <FormulaText formula={formula} />
            {chargeE !== 0 && <sup className="leading-none">{formatCharge(chargeE)}</sup>}
          </Fragment>
        ))}
      </span>
      {detail !== '' && <span className="text-soft"> {detail}</span>}
    </span>
  );
}
