import { Global, Module } from '@nestjs/common';

import { Clock, SystemClock } from './clock.js';
import { APP_CONFIG, readConfig, type AppConfig } from './environment.js';

@Global()
@Module({
  providers: [
    { provide: APP_CONFIG, useFactory: (): AppConfig => readConfig(process.env) },
    { provide: Clock, useClass: SystemClock },
  ],
  exports: [APP_CONFIG, Clock],
})
export class ConfigModule {}
