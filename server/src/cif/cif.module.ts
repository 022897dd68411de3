import { Module } from '@nestjs/common';

import { CifController } from './cif.controller.js';
import { CifService } from './cif.service.js';

@Module({ controllers: [CifController], providers: [CifService] })
export class CifModule {}
