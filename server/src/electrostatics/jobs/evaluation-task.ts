import type { EvaluationProblem, EvaluationResult } from '#common/schemas/evaluation';
import type { CellDefinition, EvaluationMethod } from '#common/schemas/cell';

/** What a worker thread is asked about a cell. */
export type EvaluationTask = {
  readonly cell: CellDefinition;
  readonly method: EvaluationMethod;
} & (
  | { /** What it is, and the address of its evaluation. */ readonly kind: 'identify' }
  | { readonly kind: 'evaluate' }
  | {
      /** Whether its pair ledger has this row, at whatever reach. */
      readonly kind: 'find_pair';
      readonly pairKey: string;
    }
);

/** A task on its way to a thread, which sets the first element to 1 when it begins. */
export type QueuedTask = EvaluationTask & { readonly begun: Int32Array };

/** What a cell is, whether or not it can be evaluated. */
export interface CellIdentity {
  /** SHA-256 of exactly what an evaluation depends on, hexadecimal. */
  readonly hash: string;
  readonly formula: string;
  readonly spaceGroupNumber: number | null;
  readonly spaceGroupSymbol: string | null;
}

export type TaskAnswer =
  | { readonly kind: 'identity'; readonly identity: CellIdentity }
  | {
      readonly kind: 'evaluation';
      readonly hash: string;
      readonly result: EvaluationResult;
      readonly durationMs: number;
    }
  | { readonly kind: 'pair'; readonly isThere: boolean }
  | { readonly kind: 'problem'; readonly problem: EvaluationProblem };
