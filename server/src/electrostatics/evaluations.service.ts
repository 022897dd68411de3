import { Injectable } from '@nestjs/common';

import { errorCodes, type ErrorCode } from '#common/errors/error-codes';
import { Problem } from '#common/errors/problem';
import {
  defaultEvaluationMethod,
  type CellDefinition,
  type EvaluationMethod,
} from '#common/schemas/cell';
import type { EvaluationProblem } from '#common/schemas/evaluation';
import { assertCan, type RequestContext } from '#server/http/request-context';

import type { EvaluationRow } from './evaluation.table.js';
import { EvaluationsRepository } from './evaluations.repository.js';
import { Abandoned, EvaluationPool } from './jobs/evaluation-pool.js';
import type { CellIdentity } from './jobs/evaluation-task.js';

type Computed =
  | { readonly evaluation: EvaluationRow; readonly problem: null }
  | { readonly evaluation: null; readonly problem: EvaluationProblem };

/** What a cell is, and its evaluation or why it has none although it can be read. */
export type CellOutcome = Computed & { readonly identity: CellIdentity };

/** A computation under way, and how many wait for it. */
interface Flight {
  readonly computed: Promise<Computed>;
  readonly cancel: AbortController;
  waiting: number;
}

const isKnown = (code: string): code is ErrorCode => Object.hasOwn(errorCodes, code);

function asProblem({ code, message, fields }: EvaluationProblem): Problem {
  return new Problem(isKnown(code) ? code : 'request.invalid', message, { fields });
}

@Injectable()
export class EvaluationsService {
  private readonly flights = new Map<string, Flight>();

  constructor(
    private readonly repository: EvaluationsRepository,
    private readonly pool: EvaluationPool,
  ) {}

  /**
   * The evaluation of a cell: looked up by its address, else computed and kept.
   * @param gone raised when the caller no longer waits
   * @throws {Problem} what is wrong with the cell, field by field; `server.busy`,
   *   `evaluation.timeout`
   */
  async evaluate(
    context: RequestContext,
    cell: CellDefinition,
    method: EvaluationMethod = defaultEvaluationMethod,
    gone?: AbortSignal,
  ): Promise<EvaluationRow> {
    assertCan(context, 'evaluation.run');
    const { evaluation, problem } = await this.outcomeOf(context.workspace.id, cell, method, gone);
    if (evaluation === null) {
      throw asProblem(problem);
    }
    return evaluation;
  }

  /**
   * A result this workspace has asked for.
   * @throws {Problem} `evaluation.not_found`
   */
  async read(context: RequestContext, hash: string): Promise<EvaluationRow> {
    assertCan(context, 'lattice.read');
    const row = /^[0-9a-f]{64}$/.test(hash)
      ? await this.repository.findUsed(context.workspace.id, hash)
      : null;
    if (row === null) {
      throw new Problem('evaluation.not_found');
    }
    return row;
  }

  /** A kept result by its hash, for what names it. */
  find(hash: string): Promise<EvaluationRow | null> {
    return this.repository.find(hash);
  }

  /** Drops old results that no revision names; asked for again, they are computed again. */
  forgetUnnamed(computedBefore: Date): Promise<number> {
    return this.repository.removeUnnamed(computedBefore);
  }

  /**
   * What a cell is and its evaluation, or why it has none. For other services, which have checked
   * access already.
   * @throws {Problem} if the cell can't be read; `server.busy`, `evaluation.timeout`
   */
  async outcomeOf(
    workspaceId: string,
    cell: CellDefinition,
    method: EvaluationMethod,
    gone?: AbortSignal,
  ): Promise<CellOutcome> {
    const answer = await this.pool.run({ kind: 'identify', cell, method }, gone);
    if (answer.kind === 'problem') {
      throw asProblem(answer.problem);
    }
    if (answer.kind !== 'identity') {
      throw new Error('A worker answered another question.');
    }
    const { identity } = answer;
    const kept = await this.repository.find(identity.hash);
    const computed =
      kept === null
        ? await this.join(identity.hash, cell, method, gone)
        : { evaluation: kept, problem: null };
    if (computed.evaluation !== null) {
      await this.repository.noteUse(workspaceId, identity.hash);
    }
    return { ...computed, identity };
  }

  /** Whether the pair ledger of a cell has a row of this name, at whatever reach. */
  async hasPair(cell: CellDefinition, method: EvaluationMethod, pairKey: string): Promise<boolean> {
    const answer = await this.pool.run({ kind: 'find_pair', cell, method, pairKey });
    return answer.kind === 'pair' && answer.isThere;
  }

  /** Waits for the computation of this hash, starting it if it isn't under way. */
  private async join(
    hash: string,
    cell: CellDefinition,
    method: EvaluationMethod,
    gone?: AbortSignal,
  ): Promise<Computed> {
    if (gone?.aborted === true) {
      throw new Abandoned();
    }
    const flight = this.flights.get(hash) ?? this.start(hash, cell, method);
    flight.waiting += 1;
    const leave = () => {
      flight.waiting -= 1;
      if (flight.waiting === 0) {
        // Whoever asks from now on must not join a computation that is about to end.
        this.flights.delete(hash);
        flight.cancel.abort();
      }
    };
    gone?.addEventListener('abort', leave, { once: true });
    try {
      return await flight.computed;
    } finally {
      gone?.removeEventListener('abort', leave);
    }
  }

  private start(hash: string, cell: CellDefinition, method: EvaluationMethod): Flight {
    const cancel = new AbortController();
    const flight: Flight = {
      cancel,
      waiting: 0,
      computed: this.compute(cell, method, cancel.signal).finally(() => {
        if (this.flights.get(hash) === flight) {
          this.flights.delete(hash);
        }
      }),
    };
    this.flights.set(hash, flight);
    return flight;
  }

  private async compute(
    cell: CellDefinition,
    method: EvaluationMethod,
    abandoned: AbortSignal,
  ): Promise<Computed> {
    const answer = await this.pool.run({ kind: 'evaluate', cell, method }, abandoned);
    switch (answer.kind) {
      case 'problem':
        return { evaluation: null, problem: answer.problem };
      case 'evaluation': {
        const { hash, result, durationMs } = answer;
        const row = { hash, engine: result.engine, method: result.method, result, durationMs };
        return { evaluation: await this.repository.keep(row), problem: null };
      }
      default:
        throw new Error('A worker answered another question.');
    }
  }
}
