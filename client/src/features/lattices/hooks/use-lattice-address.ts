import { useCallback, useEffect, useMemo, useRef } from 'react';
import { useSearchParams } from 'react-router-dom';

import type { PairLedger } from '#common/schemas/evaluation';
import { formatSceneView, parseSceneView, type SceneView } from '#client/scene/model/scene-view.ts';

const sectionKeys = [
  'energy',
  'spacing',
  'formation',
  'checks',
  'cell',
  'sites',
  'remarks',
  'history',
] as const;
export type SectionKey = (typeof sectionKeys)[number];

/** Sections that follow from the cell and its model, in their order. */
export const computedSections: readonly SectionKey[] = ['energy', 'spacing', 'formation', 'checks'];

/** What one looks at and how: lives in the address, so that a reload or a sent link shows the same. */
export interface LatticeAddress {
  readonly section: SectionKey;
  /** An older revision; null: the newest state. */
  readonly revision: number | null;
  /** Ids of the ions picked in the stage. */
  readonly picked: readonly string[];
  /** Key of the selected ledger row. */
  readonly row: string | null;
  readonly reachA: number | null;
  readonly view: PairLedger['view'];
  readonly repeat: readonly [number, number, number];
  readonly camera: SceneView | null;
  /** Number of the remark that was opened. */
  readonly remark: number | null;
}

const mostRepeats = 8;

function positive(text: string | null): number | null {
  const value = Number(text);
  return text !== null && text !== '' && Number.isFinite(value) && value > 0 ? value : null;
}

function readRepeat(text: string | null): [number, number, number] {
  const parts = text?.split('x').map(Number) ?? [];
  const isFit = parts.length === 3 && parts.every((one) => Number.isInteger(one) && one >= 1);
  const [a = 1, b = 1, c = 1] = isFit ? parts.map((one) => Math.min(one, mostRepeats)) : [];
  return [a, b, c];
}

/** Reads the address; what makes no sense counts as not given. */
export function readLatticeAddress(params: URLSearchParams): LatticeAddress {
  const section = sectionKeys.find((key) => key === params.get('section')) ?? 'energy';
  const revision = positive(params.get('rev'));
  const remark = positive(params.get('remark'));
  return {
    section,
    revision: revision === null ? null : Math.trunc(revision),
    picked: (params.get('sel') ?? '').split(',').filter((id) => id !== ''),
    row: params.get('row'),
    reachA: positive(params.get('reach')),
    view: params.get('ledger') === 'neutralised' ? 'neutralised' : 'bare',
    repeat: readRepeat(params.get('rep')),
    camera: parseSceneView(params.get('cam') ?? ''),
    remark: remark === null ? null : Math.trunc(remark),
  };
}

/** The changed parts written into the parameters; defaults leave no trace. */
export function writeLatticeAddress(
  params: URLSearchParams,
  change: Partial<LatticeAddress>,
): URLSearchParams {
  const next = new URLSearchParams(params);
  const put = (name: string, text: string | null): void =>
    text === null || text === '' ? next.delete(name) : next.set(name, text);
  const writers: { [Key in keyof LatticeAddress]: (value: LatticeAddress[Key]) => void } = {
    section: (value) => put('section', value === 'energy' ? null : value),
    revision: (value) => put('rev', value === null ? null : String(value)),
    picked: (value) => put('sel', value.join(',')),
    row: (value) => put('row', value),
    reachA: (value) => put('reach', value === null ? null : String(Number(value.toFixed(3)))),
    view: (value) => put('ledger', value === 'bare' ? null : value),
    repeat: (value) => put('rep', value.every((one) => one === 1) ? null : value.join('x')),
    camera: (value) => put('cam', value === null ? null : formatSceneView(value)),
    remark: (value) => put('remark', value === null ? null : String(value)),
  };
  for (const key of Object.keys(change) as (keyof LatticeAddress)[]) {
    (writers[key] as (value: unknown) => void)(change[key]);
  }
  return next;
}

/** The view that the address holds, and a way to change parts of it. */
export function useLatticeAddress(): [LatticeAddress, (change: Partial<LatticeAddress>) => void] {
  const [params, setParams] = useSearchParams();
  const address = useMemo(() => readLatticeAddress(params), [params]);
  // Two changes may come in one event, before the router has rendered the first.
  const latest = useRef(params);
  useEffect(() => {
    latest.current = params;
  }, [params]);
  const update = useCallback(
    (change: Partial<LatticeAddress>) => {
      latest.current = writeLatticeAddress(latest.current, change);
      setParams(latest.current, { replace: true, preventScrollReset: true });
    },
    [setParams],
  );
  return [address, update];
}
