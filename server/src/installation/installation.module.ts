import { Global, Module } from '@nestjs/common';

import { InstallationRepository } from './installation.repository.js';

@Global()
@Module({ providers: [InstallationRepository], exports: [InstallationRepository] })
export class InstallationModule {}
