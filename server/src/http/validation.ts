import { StandardSchemaValidationPipe, type ArgumentMetadata } from '@nestjs/common';

import { Problem, type FieldProblem } from '#common/errors/problem';

import { findUnstorableText } from './unstorable-text.js';

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

class RequestPipe extends StandardSchemaValidationPipe {
  override async transform<T>(value: T, metadata: ArgumentMetadata): Promise<T> {
    const isContent = metadata.type === 'body' || metadata.type === 'query';
    const field = isContent ? findUnstorableText(value) : null;
    if (field !== null) {
      const message = 'Leave out characters that are no text.';
      throw new Problem('request.invalid', `${field}: ${message}`, {
        fields: [{ code: 'request.invalid', field, message }],
      });
    }
    return super.transform(value, metadata);
  }

  /**
   * The pipe would take out fields called `prototype`, which a lattice has. Our contracts name
   * their keys, so that none of these ever reaches a real prototype.
   */
  protected override stripProtoKeys(): void {}
}

/** Checks bodies, queries and parameters that carry a schema: `@Body({ schema })`. */
export const createValidationPipe = (): StandardSchemaValidationPipe =>
  new RequestPipe({
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
