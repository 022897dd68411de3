import { Module, type OnModuleInit } from '@nestjs/common';

import { loadSpaceGroups } from './space-groups.js';
import { SymmetryController } from './symmetry.controller.js';

/** Space-group tables over HTTP; other modules use the functions of `space-groups.ts`. */
@Module({ controllers: [SymmetryController] })
export class SymmetryModule implements OnModuleInit {
  /** Reads the tables before the first request, so that none waits for them. */
  onModuleInit(): void {
    loadSpaceGroups();
  }
}
