import { Inject, Injectable } from '@nestjs/common';

import { shippedValue } from '#common/chemistry/data-catalogue';
import type { DataKey } from '#common/chemistry/data-key';
import type { DataOverrides } from '#common/chemistry/sourced';
import { Problem } from '#common/errors/problem';
import { dataValuesLimit, type SetDataValueRequest } from '#common/schemas/data-values';
import { AuditService } from '#server/audit/audit.service';
import { Clock } from '#server/config/clock';
import {
  DATABASE,
  withTransaction,
  type Database,
  type Transaction,
} from '#server/database/database';
import { assertCan, type RequestContext } from '#server/http/request-context';

import { assertDataKey, assertDataValue } from './data-values.errors.js';
import { DataValuesRepository, type OwnValueRow } from './data-values.repository.js';

const inUnit = (value: number | undefined, { facts }: DataKey): string =>
  value === undefined ? 'none' : `${value} ${facts.unit}`.trim();

@Injectable()
export class DataValuesService {
  constructor(
    private readonly values: DataValuesRepository,
    private readonly audit: AuditService,
    private readonly clock: Clock,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  async list(context: RequestContext): Promise<OwnValueRow[]> {
    assertCan(context, 'workspace.read');
    return this.values.list(context.workspace.id);
  }

  /** A workspace's own values as the look-ups of common/chemistry take them. */
  async overridesOf(workspaceId: string): Promise<DataOverrides> {
    const rows = await this.values.list(workspaceId);
    return new Map(rows.map(({ key, value, note }) => [key, { value, note }]));
  }

  /**
   * Puts a value in place of the shipped one, or of the workspace's earlier one.
   * @throws {Problem} `data.key`, `data.value`, `data.too_many`
   */
  async set(
    context: RequestContext,
    key: string,
    { value, note }: SetDataValueRequest,
  ): Promise<OwnValueRow> {
    assertCan(context, 'data.override');
    const read = assertDataKey(key);
    assertDataValue(read, value);
    const workspaceId = context.workspace.id;
    return withTransaction(this.db, async (tx) => {
      const earlier = await this.values.find(workspaceId, key, tx);
      await this.assertRoom(workspaceId, earlier, tx);
      const row = { workspaceId, key, value, note, setById: context.user.id };
      await this.values.put({ ...row, setAt: this.clock.now() }, tx);
      const before = earlier?.value ?? shippedValue(key)?.value;
      const detail = `${inUnit(before, read)} → ${inUnit(value, read)}`;
      await this.audit.record(context, 'data.override', key, detail, tx);
      return this.found(await this.values.find(workspaceId, key, tx));
    });
  }

  /**
   * Goes back to the shipped value.
   * @throws {Problem} `data.key`, `data.not_found`
   */
  async restore(context: RequestContext, key: string): Promise<void> {
    assertCan(context, 'data.override');
    const read = assertDataKey(key);
    await withTransaction(this.db, async (tx) => {
      const own = this.found(await this.values.find(context.workspace.id, key, tx));
      await this.values.remove(context.workspace.id, key, tx);
      const detail = `${inUnit(own.value, read)} → ${inUnit(shippedValue(key)?.value, read)}`;
      await this.audit.record(context, 'data.restore', key, detail, tx);
    });
  }

  private async assertRoom(
    workspaceId: string,
    earlier: OwnValueRow | null,
    tx: Transaction,
  ): Promise<void> {
    if (earlier === null && (await this.values.count(workspaceId, tx)) >= dataValuesLimit) {
      throw new Problem('data.too_many');
    }
  }

  private found(row: OwnValueRow | null): OwnValueRow {
    if (row === null) {
      throw new Problem('data.not_found');
    }
    return row;
  }
}
