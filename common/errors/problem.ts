import { z } from 'zod';

import { errorCodes, type ErrorCode } from '#common/errors/error-codes';

/** One field that is wrong, its path in the body (`cell.sites.0.x`), and how to mend it. */
export const fieldProblem = z.object({
  code: z.string(),
  field: z.string(),
  message: z.string(),
});
export type FieldProblem = z.infer<typeof fieldProblem>;

/** The one error shape of the API. */
export const problemBody = z.object({
  error: z.object({
    code: z.string(),
    message: z.string(),
    /** The request id, also sent as `x-request-id`: quote it when asking for help. */
    requestId: z.string().optional(),
    details: z
      .object({
        fields: z.array(fieldProblem).optional(),
        /** Seconds to wait, for slowed requests. */
        retryAfterSeconds: z.number().optional(),
        /** The ETag that is current, for draft conflicts. */
        currentEtag: z.string().optional(),
        line: z.number().optional(),
      })
      .optional(),
  }),
});
export type ProblemBody = z.infer<typeof problemBody>;
export type ProblemDetails = NonNullable<ProblemBody['error']['details']>;

/** An expected failure with a code; the server's filter and the command line print it. */
export class Problem extends Error {
  /**
   * @param code one of {@link errorCodes}
   * @param message what is wrong and how to mend it; the code's own text when left out
   * @param details the fields at fault and the like
   */
  constructor(
    readonly code: ErrorCode,
    message: string = errorCodes[code][1],
    readonly details?: ProblemDetails,
  ) {
    super(message);
    this.name = 'Problem';
  }

  /** HTTP status of the code. */
  get status(): number {
    return errorCodes[this.code][0];
  }
}
