import { Inject, Injectable, Logger, type OnApplicationBootstrap } from '@nestjs/common';

import { APP_CONFIG, type AppConfig } from '#server/config/environment';
import type { RequestContext } from '#server/http/request-context';
import { InstallationRepository } from '#server/installation/installation.repository';
import { UsersService } from '#server/users/users.service';
import type { WorkspaceRow } from '#server/workspaces/workspace.table';
import { WorkspacesService } from '#server/workspaces/workspaces.service';

import {
  demoPassword,
  demoPeople,
  demoWorkspaceName,
  type DemoPerson,
  type DemoPersonKey,
} from './demo-people.js';
import { DemoStoryService } from './demo-story.service.js';
import { DemoRepository } from './demo.repository.js';

const emails = demoPeople.map(({ email }) => email);

/** Fills an empty server with the demo workspace before the first request. */
@Injectable()
export class DemoService implements OnApplicationBootstrap {
  private readonly logger = new Logger('Demo');

  constructor(
    private readonly repository: DemoRepository,
    private readonly installation: InstallationRepository,
    private readonly users: UsersService,
    private readonly workspaces: WorkspacesService,
    private readonly story: DemoStoryService,
    @Inject(APP_CONFIG) private readonly config: AppConfig,
  ) {}

  async onApplicationBootstrap(): Promise<void> {
    if (this.config.isDemo) {
      await this.repository.exclusively(() => this.makeOnce());
    }
  }

  /**
   * The notice is written last, so that a start that was cut short is seen by its absence; what it
   * has left is removed and made anew. A server that anyone else uses is left alone.
   */
  private async makeOnce(): Promise<void> {
    const isMade = (await this.installation.readDemoNotice()) !== null;
    if (isMade || (await this.repository.hasOthers(emails))) {
      return;
    }
    await this.repository.clear(emails);
    const workspace = await this.workspaces.createWorkspace(demoWorkspaceName);
    const cast = {} as Record<DemoPersonKey, RequestContext>;
    for (const person of demoPeople) {
      cast[person.key] = await this.admit(person, workspace);
    }
    await this.story.play(cast);
    await this.installation.writeDemoNotice({
      workspaceName: demoWorkspaceName,
      password: demoPassword,
      people: demoPeople.map(({ name, email, role }) => ({ name, email, role })),
    });
    this.logger.log('The demo workspace is made.');
  }

  private async admit(person: DemoPerson, workspace: WorkspaceRow): Promise<RequestContext> {
    const { name, email, role } = person;
    const { id } = await this.users.createUser({ name, email, password: demoPassword });
    await this.workspaces.addMember(workspace.id, id, role);
    const { requiresSecondPerson, readersMayComment } = workspace;
    return {
      requestId: 'demo',
      address: null,
      user: { id, name, email },
      workspace,
      actor: { userId: id, role, requiresSecondPerson, readersMayComment },
    };
  }
}
