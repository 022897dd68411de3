import { Global, Module } from '@nestjs/common';

import { readConfig, type AppConfig } from './environment.js';

/** Token of the {@link AppConfig}: `@Inject(APP_CONFIG) config: AppConfig`. */
export const APP_CONFIG = Symbol('APP_CONFIG');

@Global()
@Module({
  providers: [{ provide: APP_CONFIG, useFactory: (): AppConfig => readConfig(process.env) }],
  exports: [APP_CONFIG],
})
export class ConfigModule {}
