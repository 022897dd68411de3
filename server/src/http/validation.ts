import { StandardSchemaValidationPipe } from '@nestjs/common';

import { Problem, type FieldProblem } from '#common/errors/problem';

type Issues = Parameters<
  NonNullable<
    NonNullable<ConstructorParameters<typeof StandardSchemaValidationPipe>[0]>['exceptionFactory']
  >
>[0];
type PathPart = NonNullable<Issues[number]['path']>[number];

const maxReported = 50;

const partText = (part: PathPart): string =>
  String(typeof part === 'object' && part !== null ? part.key : part);

/** Failures of a schema as fields of the request. */
function fieldProblems(issues: Issues): FieldProblem[] {
  return issues.slice(0, maxReported).map((issue) => ({
    code: 'request.invalid',
    field: (issue.path ?? []).map(partText).join('.'),
    message: issue.message,
  }));
}

/** Checks bodies, queries and parameters that carry a schema: `@Body({ schema })`. */
export const createValidationPipe = (): StandardSchemaValidationPipe =>
  new StandardSchemaValidationPipe({
    exceptionFactory: (issues) => {
      const fields = fieldProblems(issues);
      const first = fields[0];
      const where = first === undefined || first.field === '' ? '' : `${first.field}: `;
      return new Problem(
        'request.invalid',
        first === undefined ? undefined : `${where}${first.message}`,
        { fields },
      );
    },
  });
