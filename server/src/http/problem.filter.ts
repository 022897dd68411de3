import {
  Catch,
  HttpException,
  Logger,
  type ArgumentsHost,
  type ExceptionFilter,
} from '@nestjs/common';
import { ThrottlerException } from '@nestjs/throttler';
import type { Request, Response } from 'express';

import { Problem, type ProblemBody } from '#common/errors/problem';

import { requestIdOf } from './request-state.js';

/** Status that a library (the body parser, say) has put on its error. */
function statusOf(error: unknown): number | null {
  if (error instanceof HttpException) {
    return error.getStatus();
  }
  const { status, expose } = (error ?? {}) as { status?: unknown; expose?: unknown };
  return typeof status === 'number' && expose === true ? status : null;
}

const messageOf = (error: unknown): string =>
  error instanceof Error ? error.message.replace(/\.$/, '') : 'it is malformed';

/** What a failure is to the caller; null when nobody expected it. */
function asProblem(error: unknown): Problem | null {
  if (error instanceof Problem) {
    return error;
  }
  if (error instanceof ThrottlerException) {
    return new Problem('request.too_many');
  }
  const status = statusOf(error);
  switch (status) {
    case 404:
    case 405:
      return new Problem('route.not_found');
    case 413:
      return new Problem('request.too_large');
    default:
      return status !== null && status >= 400 && status < 500
        ? new Problem('request.invalid', `The request can’t be read: ${messageOf(error)}.`)
        : null;
  }
}

/** Prints every failure in the one error shape; what nobody expected is logged and stays vague. */
@Catch()
export class ProblemFilter implements ExceptionFilter {
  private readonly logger = new Logger('Request');

  catch(error: unknown, host: ArgumentsHost): void {
    const http = host.switchToHttp();
    const requestId = requestIdOf(http.getRequest<Request>());
    const response = http.getResponse<Response>();
    const problem = asProblem(error) ?? new Problem('server.unexpected');
    if (problem.status >= 500) {
      this.logger.error({ error, requestId, code: problem.code });
    }
    if (response.headersSent) {
      response.destroy();
      return;
    }
    const wait = problem.details?.retryAfterSeconds;
    if (wait !== undefined) {
      response.setHeader('retry-after', String(Math.ceil(wait)));
    }
    response.setHeader('cache-control', 'no-store');
    const body: ProblemBody = {
      error: {
        code: problem.code,
        message: problem.message,
        requestId,
        ...(problem.details === undefined ? {} : { details: problem.details }),
      },
    };
    response.status(problem.status).json(body);
  }
}
