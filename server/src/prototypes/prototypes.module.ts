import { Module } from '@nestjs/common';

import { PrototypesController } from './prototypes.controller.js';
import { PrototypesService } from './prototypes.service.js';

@Module({ controllers: [PrototypesController], providers: [PrototypesService] })
export class PrototypesModule {}
