import type { FieldProblem, ProblemDetails } from '#common/errors/problem';

/** A request that failed: the API's own answer, or `network.unreachable` / `answer.unexpected`. */
export class ApiError extends Error {
  /**
   * @param status HTTP status; 0 when no answer came
   * @param code a code of common/errors, or one of the two above
   */
  constructor(
    readonly status: number,
    readonly code: string,
    message: string,
    readonly details: ProblemDetails = {},
    readonly requestId: string | null = null,
  ) {
    super(message);
    this.name = 'ApiError';
  }

  /** The fields at fault, with their paths in the body. */
  get fields(): readonly FieldProblem[] {
    return this.details.fields ?? [];
  }

  /** Whether asking again, unchanged, may help. */
  get isTransient(): boolean {
    return this.status === 0 || this.status >= 500;
  }
}

/** Whether a failure is an API answer with this code. */
export function hasCode(error: unknown, code: string): error is ApiError {
  return error instanceof ApiError && error.code === code;
}

/** One sentence a person can read, whatever was thrown. */
export function messageOf(error: unknown): string {
  return error instanceof ApiError
    ? error.message
    : 'Something went wrong on this page. Load it again.';
}
