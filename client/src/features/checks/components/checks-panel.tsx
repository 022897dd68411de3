import { useMemo, type JSX } from 'react';

import { hazardsOf } from '#common/chemistry/hazards';
import type { DataOverrides } from '#common/chemistry/sourced';
import type { CheckResult } from '#common/physics/checks/check-result';
import { judge } from '#common/physics/checks/judge';
import { checkLimits, type CheckLimitKey } from '#common/physics/checks/limits';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EnergeticModel, VerdictSummary } from '#common/schemas/energetics';
import type { EvaluationResult } from '#common/schemas/evaluation';
import { formatTidy } from '#common/units/format';
import { VerdictBadge } from '#client/components/verdict-badge.tsx';

interface ChecksPanelProps {
  cell: ResolvedCell;
  /** Null when the cell was not evaluated. */
  result: EvaluationResult | null;
  /** Why it was not. */
  problem: string | null;
  model: EnergeticModel;
  overrides: DataOverrides;
}

function counted({ holds, doubtful, fails, notJudged }: VerdictSummary): string {
  return [
    `${holds} ${holds === 1 ? 'holds' : 'hold'}`,
    ...(doubtful > 0 ? [`${doubtful} doubtful`] : []),
    ...(fails > 0 ? [`${fails} ${fails === 1 ? 'fails' : 'fail'}`] : []),
    ...(notJudged > 0 ? [`${notJudged} not judged`] : []),
  ].join(' · ');
}

const verdictSentence: Readonly<Record<VerdictSummary['word'], string>> = {
  holds: 'Every check that could be made holds.',
  doubtful: 'Something deserves a second look.',
  fails: 'Something is wrong with this cell.',
  not_judged: 'Nothing could be judged yet.',
};

function Limit({ limitKey }: { limitKey: CheckLimitKey }): JSX.Element {
  const { name, value, unit, source } = checkLimits[limitKey];
  return (
    <li>
      {name} {formatTidy(value, 3)}
      {unit === '' ? '' : ` ${unit}`}
      <span className="text-faint"> · </span>
      {source}
    </li>
  );
}

function Check({ check }: { check: CheckResult }): JSX.Element {
  return (
    <li className="grid grid-cols-[6.4rem_minmax(0,1fr)] gap-x-3 border-b border-wash py-3">
      <VerdictBadge word={check.word} />
      <div>
        <h3 className="font-medium">{check.name}</h3>
        <p className={check.word === 'not_judged' ? 'text-soft' : ''}>{check.finding}</p>
        {check.labels.length > 0 && (
          <p className="text-small text-soft">concerns {check.labels.join(', ')}</p>
        )}
        {check.limits.length > 0 && (
          <details className="mt-1 text-small text-soft">
            <summary className="w-max cursor-pointer rounded-control hover:text-ink">
              limits
            </summary>
            <ul className="mt-1 grid gap-0.5">
              {check.limits.map((key) => (
                <Limit key={key} limitKey={key} />
              ))}
            </ul>
          </details>
        )}
      </div>
    </li>
  );
}

function Caution({ cell }: { cell: ResolvedCell }): JSX.Element | null {
  const notes = useMemo(() => hazardsOf(cell), [cell]);
  return notes.length === 0 ? null : (
    <aside aria-labelledby="caution" className="mt-6 border-l-3 border-doubtful bg-wash px-4 py-3">
      <h2 id="caution" className="font-bold">
        Caution
      </h2>
      <ul className="mt-1 grid gap-1">
        {notes.map((note) => (
          <li key={note}>{note}</li>
        ))}
      </ul>
      <p className="mt-2 text-small text-soft">
        General knowledge, not a safety assessment. Before anyone handles the substance: its safety
        data sheet, your local codes, and people licensed for the work decide.
      </p>
    </aside>
  );
}

/** All checks of a cell, the verdict on top. */
export function ChecksPanel(props: ChecksPanelProps): JSX.Element {
  const { cell, result, problem, model, overrides } = props;
  const { checks, verdict } = useMemo(
    () => judge(cell, result, model, overrides),
    [cell, result, model, overrides],
  );
  return (
    <>
      <section aria-labelledby="verdict">
        <h2 id="verdict" className="sr-only">
          Verdict
        </h2>
        <VerdictBadge word={verdict.word} isLarge />
        <p className="mt-1">
          {verdictSentence[verdict.word]} <span className="text-soft">{counted(verdict)}</span>
        </p>
        {problem !== null && <p className="mt-2 text-soft">{problem}</p>}
      </section>
      <ul className="mt-4 border-t border-line">
        {checks.map((check) => (
          <Check key={check.key} check={check} />
        ))}
      </ul>
      <p className="mt-4 text-small text-soft">
        Checks are rules of thumb and model values. A cell that passes them may still not exist, and
        one that does not may; what they say is where to look.
      </p>
      <Caution cell={cell} />
    </>
  );
}
