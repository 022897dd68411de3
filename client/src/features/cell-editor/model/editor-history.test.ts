import { describe, expect, it } from 'vitest';

import { defaultEvaluationMethod } from '#common/schemas/cell';
import { defaultEnergeticModel } from '#common/schemas/energetics';
import {
  isSameContent,
  pushEdit,
  redo,
  startHistory,
  undo,
  type EditorContent,
} from '#client/features/cell-editor/model/editor-history.ts';
import { cellOf } from '#client/testing/lattice-factories.ts';

const withEdge = (a: string): EditorContent => ({
  cell: cellOf({ lattice: { ...cellOf().lattice, a } }),
  method: defaultEvaluationMethod,
  model: defaultEnergeticModel,
});
const edge = (content: EditorContent): string => content.cell.lattice.a;

describe('the history of an edit', () => {
  it('goes back and forth', () => {
    const edited = pushEdit(startHistory(withEdge('4')), withEdge('5'), null, 0);
    const back = undo(edited);
    expect(edge(back.present)).toBe('4');
    expect(edge(redo(back).present)).toBe('5');
    expect(undo(undo(back))).toBe(undo(back));
  });

  it('takes the letters of one word as one step', () => {
    let history = startHistory(withEdge(''));
    ['4', '4.', '4.2'].forEach((text, index) => {
      history = pushEdit(history, withEdge(text), 'lattice.a', index * 300);
    });
    expect(history.past).toHaveLength(1);
    expect(edge(undo(history).present)).toBe('');
  });

  it('starts a new step after a pause and in another field', () => {
    let history = pushEdit(startHistory(withEdge('')), withEdge('4'), 'lattice.a', 0);
    history = pushEdit(history, withEdge('42'), 'lattice.a', 5_000);
    history = pushEdit(history, withEdge('43'), 'lattice.b', 5_100);
    expect(history.past).toHaveLength(3);
  });

  it('forgets the way forth after a new edit, and ignores an edit that changes nothing', () => {
    const edited = pushEdit(startHistory(withEdge('4')), withEdge('5'), null, 0);
    const again = pushEdit(undo(edited), withEdge('6'), null, 1);
    expect(again.future).toHaveLength(0);
    expect(pushEdit(again, withEdge('6'), null, 2)).toBe(again);
  });

  it('compares what is said, not the order of keys', () => {
    const content = withEdge('4');
    const { cell, model } = content;
    const { a, ...rest } = cell.lattice;
    const { repulsion, ...others } = model;
    const reordered = { ...content, cell: { ...cell, lattice: { ...rest, a } } };
    expect(isSameContent(content, { ...reordered, model: { ...others, repulsion } })).toBe(true);
    const harder = { kind: 'born_mayer', hardnessA: { low: 0.3, high: 0.3 } } as const;
    expect(isSameContent(content, { ...content, model: { ...model, repulsion: harder } })).toBe(
      false,
    );
  });
});
