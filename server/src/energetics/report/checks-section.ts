import type { DataOverrides } from '#common/chemistry/sourced';
import type { CheckResult } from '#common/physics/checks/check-result';
import { judge } from '#common/physics/checks/judge';
import { checkLimits } from '#common/physics/checks/limits';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { CheckWord, EnergeticModel } from '#common/schemas/energetics';
import type { EvaluationResult } from '#common/schemas/evaluation';
import type { ReportSection } from '#common/schemas/report';

import { table, text } from './report-blocks.js';

const words: Record<CheckWord, string> = {
  holds: 'holds',
  doubtful: 'doubtful',
  fails: 'fails',
  not_judged: 'not judged',
};

function checkRow({ name, word, finding, limits }: CheckResult): string[] {
  const held = limits.map((key) => {
    const { name: what, value, unit, source } = checkLimits[key];
    return `${what} ${value}${unit === '' ? '' : ` ${unit}`} (${source})`;
  });
  return [name, words[word], finding, held.join('; ')];
}

/** Every check with its finding and the limits it was held against; none is hidden. */
export function checksSection(
  cell: ResolvedCell,
  result: EvaluationResult | null,
  model: EnergeticModel,
  overrides: DataOverrides,
): ReportSection {
  const { checks, verdict } = judge(cell, result, model, overrides);
  return {
    key: 'checks',
    title: 'Checks and verdict',
    blocks: [
      text(
        `Verdict: ${words[verdict.word]}. ${verdict.holds} hold, ${verdict.doubtful} doubtful, ` +
          `${verdict.fails} fail, ${verdict.notJudged} not judged. Held against the usual limits.`,
      ),
      table('', ['Check', 'Finding', 'Why', 'Limits'], checks.map(checkRow)),
    ],
  };
}
