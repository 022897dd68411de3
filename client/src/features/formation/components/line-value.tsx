import { RotateCcw } from 'lucide-react';
import { useId, useState, type JSX, type KeyboardEvent } from 'react';

import type { FormationLine } from '#common/physics/energetics/formation-line';
import { IconButton } from '#client/components/button.tsx';
import { lineValueOn } from '#client/features/formation/model/energy-scale.ts';
import type { EnergyScale } from '#client/lib/energy-unit.ts';
import { readNumber } from '#client/features/formation/model/formation-choices.ts';
import { classNames } from '#client/lib/class-names.ts';

interface LineValueProps {
  line: FormationLine;
  scale: EnergyScale;
  /** Null where the account may only be read. */
  onType: ((valueKjPerMol: number) => void) | null;
  onRestore: () => void;
}

const largestKjPerMol = 1e6;

function problemOf(text: string, { kjPerMol, unit }: EnergyScale): string | null {
  const value = readNumber(text);
  if (value === null) {
    return `Type one number in ${unit}, such as −364.`;
  }
  return Math.abs(value * kjPerMol) > largestKjPerMol ? 'At most a million kJ mol⁻¹.' : null;
}

function useTyping({ line, scale, onType, onRestore }: LineValueProps) {
  const [text, setText] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const shown = lineValueOn(scale, line);
  const leave = (): void => {
    setText(null);
    setProblem(null);
  };
  const commit = (): void => {
    if (text === null || text === shown || onType === null) {
      leave();
      return;
    }
    if (text.trim() === '') {
      leave();
      onRestore();
      return;
    }
    const found = problemOf(text, scale);
    setProblem(found);
    const value = readNumber(text);
    if (found === null && value !== null) {
      setText(null);
      onType(value * scale.kjPerMol);
    }
  };
  const onKeyDown = (event: KeyboardEvent): void => {
    if (event.key === 'Enter') {
      commit();
    } else if (event.key === 'Escape' && text !== null) {
      event.stopPropagation();
      leave();
    }
  };
  return { value: text ?? shown, problem, setText, commit, onKeyDown };
}

const fieldLook =
  'h-7 w-[5.5rem] rounded-control border bg-transparent px-1.5 text-right hover:border-faint ' +
  'focus:border-faint focus:bg-raised aria-invalid:border-fails placeholder:text-right';

/** The value of a line, typed over in its place; an emptied field goes back to the tables. */
export function LineValue(props: LineValueProps): JSX.Element {
  const { line, scale, onType, onRestore } = props;
  const problemId = useId();
  const { value, problem, setText, commit, onKeyDown } = useTyping(props);
  const isTypedHere = line.isTyped && !line.isSolved;
  if (onType === null || line.isSolved || !line.mayType) {
    return <span className="px-1.5">{value === '' ? '–' : value}</span>;
  }
  return (
    <span className="inline-block">
      <span className="inline-flex items-center">
        {isTypedHere && (
          <IconButton
            label={`Restore the ${line.name}`}
            icon={<RotateCcw aria-hidden className="size-3.5" />}
            className="size-7!"
            onClick={onRestore}
          />
        )}
        <input
          type="text"
          inputMode="text"
          aria-label={`${line.name}, ${scale.unit}`}
          aria-invalid={problem !== null || undefined}
          aria-describedby={problem === null ? undefined : problemId}
          placeholder="type"
          value={value}
          onChange={(event) => setText(event.target.value)}
          onFocus={(event) => event.target.select()}
          onBlur={commit}
          onKeyDown={onKeyDown}
          className={classNames(
            fieldLook,
            line.valueKjPerMol === null ? 'border-fails' : 'border-line',
            isTypedHere && 'font-medium',
            line.isExcluded && 'text-soft line-through',
          )}
        />
      </span>
      {problem !== null && (
        <span id={problemId} role="alert" className="block max-w-40 text-small text-fails">
          {problem}
        </span>
      )}
    </span>
  );
}
