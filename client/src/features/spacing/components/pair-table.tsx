import { Plus, Trash2 } from 'lucide-react';
import type { JSX } from 'react';

import {
  energeticsLimits,
  type PairPotential,
  type RepulsionModel,
} from '#common/schemas/energetics';
import { Button } from '#client/components/button.tsx';
import { IonPairText } from '#client/components/chem/ion-text.tsx';
import { speciesText } from '#client/components/chem/species-key.ts';
import { SelectField } from '#client/components/select-field.tsx';
import { RangeField } from '#client/features/spacing/components/range-field.tsx';
import { pairsOf } from '#client/features/spacing/model/repulsion-choices.ts';

type Table = Extract<RepulsionModel, { kind: 'pair_table' }>;

interface PairTableProps {
  table: Table;
  speciesKeys: readonly string[];
  onTable: ((table: Table, field: string | null) => void) | null;
}

const fields = [
  { key: 'prefactorEv', symbol: 'A', limits: { name: 'A', low: 0, high: 1e9, unit: 'eV' } },
  {
    key: 'hardnessA',
    symbol: 'ρ',
    limits: { name: 'ρ', ...energeticsLimits.hardnessA, unit: 'Å' },
  },
  { key: 'dispersionEvA6', symbol: 'C', limits: { name: 'C', low: 0, high: 1e6, unit: 'eV Å⁶' } },
] as const;

const isPair = (pair: PairPotential, a: string, b: string): boolean =>
  (pair.speciesA === a && pair.speciesB === b) || (pair.speciesA === b && pair.speciesB === a);

function AddPair({ table, speciesKeys, onTable }: PairTableProps): JSX.Element | null {
  const free = pairsOf(speciesKeys).filter(
    ([a, b]) => !table.pairs.some((pair) => isPair(pair, a, b)),
  );
  if (onTable === null || free.length === 0) {
    return null;
  }
  const add = (text: string): void => {
    const [speciesA, speciesB] = free[Number(text)]!;
    const pair = { speciesA, speciesB, prefactorEv: 1000, hardnessA: 0.345, dispersionEvA6: 0 };
    onTable({ ...table, pairs: [...table.pairs, pair] }, null);
  };
  if (free.length === 1) {
    return (
      <Button size="small" onClick={() => add('0')}>
        <Plus aria-hidden className="size-3.5" /> Add {free[0]!.map(speciesText).join(' – ')}
      </Button>
    );
  }
  return (
    <SelectField
      label="Add a pair"
      options={[
        { value: '', label: 'choose the ions', isDisabled: true },
        ...free.map((pair, index) => ({
          value: String(index),
          label: pair.map(speciesText).join(' – '),
        })),
      ]}
      value=""
      onChange={add}
      className="w-48"
    />
  );
}

/** Energies of pairs: A exp(−r/ρ) − C r⁻⁶, a row for each pair of ion kinds. */
export function PairTable(props: PairTableProps): JSX.Element {
  const { table, onTable } = props;
  const put = (index: number, change: Partial<PairPotential>, field: string): void =>
    onTable?.(
      {
        ...table,
        pairs: table.pairs.map((pair, k) => (k === index ? { ...pair, ...change } : pair)),
      },
      field,
    );
  return (
    <div className="basis-full">
      <p className="mb-2 text-small text-soft">
        Energy of a pair at distance r: A exp(−r/ρ) − C r⁻⁶. Pairs without a row don’t repel.
      </p>
      <ul className="grid gap-2.5">
        {table.pairs.map((pair, index) => (
          <li
            key={`${pair.speciesA}|${pair.speciesB}`}
            className="grid grid-cols-[1fr_auto] items-start gap-x-3 gap-y-1 border-b border-wash pb-2.5 sm:grid-cols-[6.5rem_repeat(3,minmax(0,1fr))_auto]"
          >
            <p className="pt-1 sm:pt-7">
              <IonPairText speciesA={pair.speciesA} speciesB={pair.speciesB} />
            </p>
            {onTable !== null && (
              <Button
                size="small"
                variant="quiet"
                className="sm:order-last sm:mt-6"
                aria-label={`Remove ${speciesText(pair.speciesA)} – ${speciesText(pair.speciesB)}`}
                disabled={table.pairs.length === 1}
                onClick={() => onTable({ ...table, pairs: table.pairs.toSpliced(index, 1) }, null)}
              >
                <Trash2 aria-hidden className="size-4" />
              </Button>
            )}
            <div className="col-span-2 grid grid-cols-3 gap-x-3 sm:col-span-3">
              {fields.map(({ key, symbol, limits }) => (
                <RangeField
                  key={key}
                  label={symbol}
                  limits={limits}
                  value={{ low: pair[key], high: pair[key] }}
                  onChange={
                    onTable &&
                    ((range) =>
                      range && put(index, { [key]: range.low }, `spacing.pair.${index}.${key}`))
                  }
                />
              ))}
            </div>
          </li>
        ))}
      </ul>
      <div className="mt-3 flex flex-wrap items-end gap-4">
        <RangeField
          label="Reach of the pairs"
          limits={{ name: 'the reach', low: 2, high: 30, unit: 'Å' }}
          value={{ low: table.cutoffA, high: table.cutoffA }}
          onChange={
            onTable &&
            ((range) => range && onTable({ ...table, cutoffA: range.low }, 'spacing.reach'))
          }
          className="w-36"
        />
        <AddPair {...props} />
      </div>
    </div>
  );
}
