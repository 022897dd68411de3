import { Injectable } from '@nestjs/common';

import { findElement } from '#common/chemistry/elements';
import { Problem, type FieldProblem } from '#common/errors/problem';
import type {
  AppliedPrototype,
  ApplyPrototypeRequest,
  PrototypeSummary,
} from '#common/schemas/prototype';

import { applyPrototype } from './apply-prototype.js';
import { readPrototypes } from './prototypes.js';

/** The shipped structure types. */
@Injectable()
export class PrototypesService {
  private readonly prototypes = readPrototypes();

  list(): PrototypeSummary[] {
    return this.prototypes.map(({ summary }) => summary);
  }

  /**
   * Puts ions into a structure type.
   * @throws Problem `prototype.not_found`, or `request.invalid` naming the ions at fault
   */
  apply(id: string, { ions }: ApplyPrototypeRequest): AppliedPrototype {
    const prototype = this.prototypes.find(({ facts }) => facts.id === id);
    if (!prototype) {
      throw new Problem('prototype.not_found');
    }
    const fields = ionProblems(ions, prototype.summary);
    if (fields.length > 0) {
      throw new Problem('request.invalid', fields[0]!.message, { fields });
    }
    return applyPrototype(
      prototype,
      ions.map(({ element, charge }) => ({ element, chargeE: charge })),
    );
  }
}

function ionProblems(
  ions: ApplyPrototypeRequest['ions'],
  { name, roles }: PrototypeSummary,
): FieldProblem[] {
  if (ions.length !== roles.length) {
    return [
      {
        code: 'request.invalid',
        field: 'ions',
        message: `${name} takes ${roles.length} ions, one for each of ${roles.map(({ element }) => element).join(', ')}; ${ions.length} were given.`,
      },
    ];
  }
  return ions.flatMap(({ element }, index) =>
    findElement(element)
      ? []
      : [
          {
            code: 'cell.element',
            field: `ions.${index}.element`,
            message: `There is no element “${element}”. Use a symbol such as ${roles[index]!.element}.`,
          },
        ],
  );
}
