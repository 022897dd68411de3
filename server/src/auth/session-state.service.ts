import { Inject, Injectable } from '@nestjs/common';

import type { SessionState } from '#common/schemas/auth';
import { APP_CONFIG, type AppConfig } from '#server/config/environment';
import { InstallationRepository } from '#server/installation/installation.repository';
import { UsersService } from '#server/users/users.service';

@Injectable()
export class SessionStateService {
  constructor(
    private readonly users: UsersService,
    private readonly installation: InstallationRepository,
    @Inject(APP_CONFIG) private readonly config: AppConfig,
  ) {}

  /** What a visitor may know: who they are, whether the server waits for its owner, the demo. */
  async stateFor(userId: string | null): Promise<SessionState> {
    return {
      user: userId === null ? null : await this.users.currentUser(userId),
      needsSetup: !this.config.isDemo && !(await this.users.hasAny()),
      demo: this.config.isDemo ? await this.installation.readDemoNotice() : null,
    };
  }
}
