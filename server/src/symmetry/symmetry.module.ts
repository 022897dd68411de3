import { Module } from '@nestjs/common';

import { SymmetryController } from './symmetry.controller.js';

/** Space-group tables over HTTP; other modules use the functions of `space-groups.ts`. */
@Module({ controllers: [SymmetryController] })
export class SymmetryModule {}
