import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { defaultEvaluationMethod } from '#common/schemas/cell';
import { defaultEnergeticModel } from '#common/schemas/energetics';
import type { Draft } from '#common/schemas/lattice';
import {
  DraftKeeper,
  type KeeperWorld,
  type UnsavedCopy,
} from '#client/features/cell-editor/model/draft-keeper.ts';
import type { EditorContent } from '#client/features/cell-editor/model/editor-history.ts';
import { ApiError } from '#client/lib/api-error.ts';
import { cellOf, draftOf, mara } from '#client/testing/lattice-factories.ts';

const withEdge = (a: string): EditorContent => ({
  cell: cellOf({ lattice: { ...cellOf().lattice, a } }),
  method: defaultEvaluationMethod,
  model: defaultEnergeticModel,
});
const conflict = new ApiError(412, 'draft.conflict', 'Someone else changed this draft.');
const offline = new ApiError(0, 'network.unreachable', 'No connection.');

interface Setup {
  keeper: DraftKeeper;
  put: ReturnType<typeof vi.fn<KeeperWorld['put']>>;
  read: ReturnType<typeof vi.fn<KeeperWorld['read']>>;
  kept: () => UnsavedCopy | null;
}

function setUp(): Setup {
  let copy: UnsavedCopy | null = null;
  let version = 0;
  const put = vi.fn<KeeperWorld['put']>(async (body) => {
    version += 1;
    return draftOf({ ...body, etag: `"r4-v${version}"`, isChanged: true });
  });
  const read = vi.fn<KeeperWorld['read']>(async () => draftOf());
  const keeper = new DraftKeeper(draftOf(), {
    put,
    read,
    remember: (next) => {
      copy = next;
    },
    now: () => 1_000,
    onSaved: () => undefined,
  });
  return { keeper, put, read, kept: () => copy };
}

const theirs: Draft = draftOf({ ...withEdge('4.3'), etag: '"r4-v9"', updatedBy: mara });

beforeEach(() => {
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
});

describe('DraftKeeper', () => {
  it('saves once typing pauses, on the version it started from', async () => {
    const { keeper, put } = setUp();
    keeper.change(withEdge('4.1'));
    keeper.change(withEdge('4.15'));
    expect(put).not.toHaveBeenCalled();
    await vi.advanceTimersByTimeAsync(1_000);
    expect(put).toHaveBeenCalledExactlyOnceWith(withEdge('4.15'), '"r4-v0"');
    expect(keeper.getStatus()).toEqual({ kind: 'saved', atMs: 1_000 });
    expect(keeper.currentEtag).toBe('"r4-v1"');
  });

  it('keeps a copy on the device until the server has it', async () => {
    const { keeper, kept } = setUp();
    keeper.change(withEdge('4.1'));
    expect(kept()?.content).toEqual(withEdge('4.1'));
    await vi.advanceTimersByTimeAsync(1_000);
    expect(kept()).toBeNull();
  });

  it('tries again when the connection is back', async () => {
    const { keeper, put, kept } = setUp();
    put.mockRejectedValueOnce(offline);
    keeper.change(withEdge('4.1'));
    await vi.advanceTimersByTimeAsync(1_000);
    expect(keeper.getStatus().kind).toBe('offline');
    expect(kept()).not.toBeNull();
    await vi.advanceTimersByTimeAsync(5_000);
    expect(put).toHaveBeenCalledTimes(2);
    expect(keeper.getStatus().kind).toBe('saved');
  });

  it('stops at a conflict and shows the other version', async () => {
    const { keeper, put, read } = setUp();
    put.mockRejectedValueOnce(conflict);
    read.mockResolvedValueOnce(theirs);
    keeper.change(withEdge('4.1'));
    await vi.advanceTimersByTimeAsync(1_000);
    expect(keeper.getStatus()).toEqual({ kind: 'conflict', theirs });
    keeper.change(withEdge('4.11'));
    await vi.advanceTimersByTimeAsync(10_000);
    expect(put).toHaveBeenCalledTimes(1);
  });

  it('overwrites theirs only when told to, on their version', async () => {
    const { keeper, put, read } = setUp();
    put.mockRejectedValueOnce(conflict);
    read.mockResolvedValueOnce(theirs);
    keeper.change(withEdge('4.1'));
    await vi.advanceTimersByTimeAsync(1_000);
    await keeper.keepMine(theirs);
    expect(put).toHaveBeenLastCalledWith(withEdge('4.1'), '"r4-v9"');
    expect(keeper.getStatus().kind).toBe('saved');
  });

  it('gives up the own edit when theirs is taken', async () => {
    const { keeper, put, read, kept } = setUp();
    put.mockRejectedValueOnce(conflict);
    read.mockResolvedValueOnce(theirs);
    keeper.change(withEdge('4.1'));
    await vi.advanceTimersByTimeAsync(1_000);
    keeper.takeTheirs(theirs);
    expect(keeper.hasUnsaved).toBe(false);
    expect(keeper.currentEtag).toBe('"r4-v9"');
    expect(kept()).toBeNull();
  });

  it('is no conflict when both made the same edit', async () => {
    const { keeper, put, read } = setUp();
    put.mockRejectedValueOnce(conflict);
    read.mockResolvedValueOnce(theirs);
    keeper.change(withEdge('4.3'));
    await vi.advanceTimersByTimeAsync(1_000);
    expect(keeper.getStatus().kind).toBe('clean');
  });

  it('takes in what others saved only where nothing is unsaved', () => {
    const { keeper } = setUp();
    keeper.change(withEdge('4.1'));
    expect(keeper.receive(theirs)).toBe(false);
    keeper.change(withEdge('4.12'));
    expect(keeper.receive(theirs)).toBe(true);
  });

  it('saves an edit made while another was on its way', async () => {
    const { keeper, put } = setUp();
    let finish: (draft: Draft) => void = () => undefined;
    put.mockImplementationOnce(
      () =>
        new Promise((resolve) => {
          finish = resolve;
        }),
    );
    keeper.change(withEdge('4.1'));
    await vi.advanceTimersByTimeAsync(1_000);
    keeper.change(withEdge('4.2'));
    finish(draftOf({ etag: '"r4-v1"' }));
    await vi.advanceTimersByTimeAsync(2_000);
    expect(put).toHaveBeenLastCalledWith(withEdge('4.2'), '"r4-v1"');
    expect(keeper.hasUnsaved).toBe(false);
  });

  it('meets a copy left on an older version as a conflict', async () => {
    const { keeper, put, read } = setUp();
    read.mockResolvedValueOnce(theirs);
    keeper.restore({ etag: '"r3-v2"', content: withEdge('4.1') });
    await vi.advanceTimersByTimeAsync(1_000);
    expect(keeper.getStatus()).toEqual({ kind: 'conflict', theirs });
    expect(put).not.toHaveBeenCalled();
  });
});
