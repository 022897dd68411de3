import { Inject, Injectable } from '@nestjs/common';

import { DATABASE, type Database, type Executor } from '#server/database/database';

import { installation, type DemoNotice } from './installation.table.js';

@Injectable()
export class InstallationRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  /** Who the demo's people are; null when this server has no demo. */
  async readDemoNotice(): Promise<DemoNotice | null> {
    const [row] = await this.db.select().from(installation);
    return row?.demoNotice ?? null;
  }

  async writeDemoNotice(demoNotice: DemoNotice, executor: Executor = this.db): Promise<void> {
    await executor
      .insert(installation)
      .values({ demoNotice })
      .onConflictDoUpdate({ target: installation.isOnlyRow, set: { demoNotice } });
  }

  /** Makes whoever else wants to set the server up wait until the transaction ends. */
  async lock(executor: Executor): Promise<void> {
    await executor.insert(installation).values({}).onConflictDoNothing();
    await executor.select().from(installation).for('update');
  }
}
