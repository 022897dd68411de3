import type { CellDefinition } from '#common/schemas/cell';
import type { EditorContent } from '#client/features/cell-editor/model/editor-history.ts';

/** One place where two versions of a cell differ. */
export interface Difference {
  readonly field: string;
  readonly mine: string;
  readonly theirs: string;
}

const missing = '–';

function entries({ cell, method, model }: EditorContent): Map<string, string> {
  const map = new Map<string, string>();
  const names = { a: 'a', b: 'b', c: 'c', alpha: 'α', beta: 'β', gamma: 'γ' } as const;
  for (const [name, symbol] of Object.entries(names)) {
    map.set(symbol, cell.lattice[name as keyof CellDefinition['lattice']]);
  }
  map.set(
    'symmetry',
    cell.symmetry.kind === 'setting'
      ? `Hall number ${cell.symmetry.hallNumber}`
      : cell.symmetry.operations.join('; '),
  );
  for (const { name, expression } of cell.parameters) {
    map.set(`parameter ${name}`, expression);
  }
  for (const site of cell.sites) {
    const { label, element, charge, x, y, z, occupancy } = site;
    map.set(`site ${label}`, `${element} ${charge} at ${x}, ${y}, ${z}; occupancy ${occupancy}`);
  }
  map.set('tolerance', String(method.toleranceRelative));
  map.set('uniform background', method.uniformBackground ? 'on' : 'off');
  map.set('repulsion', JSON.stringify(model.repulsion));
  map.set('measured values', JSON.stringify(model.measured));
  map.set('formation choices', JSON.stringify(model.formation));
  return map;
}

/** Where my cell and theirs differ, field by field. */
export function differences(mine: EditorContent, theirs: EditorContent): readonly Difference[] {
  const own = entries(mine);
  const other = entries(theirs);
  const fields = new Set([...own.keys(), ...other.keys()]);
  return [...fields]
    .map((field) => ({
      field,
      mine: own.get(field) ?? missing,
      theirs: other.get(field) ?? missing,
    }))
    .filter((difference) => difference.mine !== difference.theirs);
}
