import { catalogue } from '#common/chemistry/data-catalogue';
import type { SourceStatus } from '#common/chemistry/sourced';
import {
  say,
  tabulate,
  type MethodSection,
} from '#client/features/methods/model/method-section.ts';

const statusWords: Record<SourceStatus, string> = {
  verified: 'checked against a second source',
  'single-source': 'one source',
  'computed-here': 'computed here',
  'from-memory': 'from memory',
  own: 'own',
};

const most = 4;

/** Each kind of tabulated value: how many, where from, how sure. */
function sourceRows(): string[][] {
  const groups = new Map<
    string,
    { name: string; unit: string; sources: Set<string>; count: number; status: SourceStatus }
  >();
  for (const { facts, shipped } of catalogue()) {
    const key = `${facts.kind} ${shipped.status}`;
    const known = groups.get(key) ?? {
      name: facts.name,
      unit: facts.unit,
      sources: new Set<string>(),
      count: 0,
      status: shipped.status,
    };
    known.sources.add(shipped.source);
    known.count += 1;
    groups.set(key, known);
  }
  return [...groups.values()].map(({ name, unit, sources, count, status }) => {
    const listed = [...sources].slice(0, most).join('; ');
    const rest = sources.size > most ? `; and ${sources.size - most} more` : '';
    return [
      unit === '' ? name : `${name}, ${unit}`,
      String(count),
      statusWords[status],
      `${listed}${rest}`,
    ];
  });
}

/** Tabulated data with their sources, counted from the tables themselves. */
export function dataSection(): MethodSection {
  return {
    id: 'data',
    title: 'Tabulated data',
    blocks: [
      say(
        'A workspace may put its own value in place of any of these; it is then marked as its own wherever it is used.',
      ),
      tabulate('Shipped tables', ['Quantity', 'Values', 'Standing', 'Source'], sourceRows()),
    ],
  };
}
