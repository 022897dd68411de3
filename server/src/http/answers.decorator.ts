import { applyDecorators, HttpCode } from '@nestjs/common';
import { ApiDefaultResponse, ApiResponse } from '@nestjs/swagger';
import type { z } from 'zod';

import { problemBody } from '#common/errors/problem';

/**
 * States what a route answers, for the status and the API's reference; the contract of failures
 * comes with it.
 * @param schema contract of the answer, from common/schemas
 * @param status 200 unless said
 */
export const Answers = (schema: z.ZodType, status = 200): MethodDecorator =>
  applyDecorators(
    HttpCode(status),
    ApiResponse({ status, standardSchema: schema as never, description: 'As asked.' }),
    ApiDefaultResponse({
      standardSchema: problemBody as never,
      description: 'Refused: a code, what is wrong and how to mend it.',
    }),
  );
