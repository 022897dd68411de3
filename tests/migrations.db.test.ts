import { cpSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

import { generateDrizzleJson, generateMigration } from 'drizzle-kit/api';
import { afterEach, describe, expect, it } from 'vitest';

import { projectRoot } from '#server/config/project-root';
import { migrateDatabase, migrationsFolder } from '#server/database/migrate';

import { createEmptyDatabase, type TestDatabase } from './helpers/database.js';

interface Journal {
  entries: { idx: number; tag: string; when: number }[];
}

const journal = JSON.parse(
  readFileSync(path.join(migrationsFolder(), 'meta', '_journal.json'), 'utf8'),
) as Journal;

const databases: TestDatabase[] = [];
const folders: string[] = [];
afterEach(async () => {
  await Promise.all(databases.splice(0).map((database) => database.drop()));
  folders.splice(0).forEach((folder) => rmSync(folder, { recursive: true }));
});

async function emptyDatabase(): Promise<TestDatabase> {
  const database = await createEmptyDatabase();
  databases.push(database);
  return database;
}

/** A copy of the migrations that ends after the first few. */
function firstMigrations(length: number): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'holdfast-migrations-'));
  folders.push(folder);
  cpSync(migrationsFolder(), folder, { recursive: true });
  const entries = journal.entries.slice(0, length);
  writeFileSync(
    path.join(folder, 'meta', '_journal.json'),
    JSON.stringify({ ...journal, entries }),
  );
  return folder;
}

/** Everything the catalogue says about our tables, in a fixed order. */
async function describeSchema({ pool }: TestDatabase): Promise<string[]> {
  const { rows } = await pool.query<{ line: string }>(`
    select format('column %s.%s %s %s %s %s', table_name, column_name, udt_name, is_nullable,
      column_default, generation_expression) as line
    from information_schema.columns where table_schema = 'public'
    union all
    select format('constraint %s %s', conname, pg_get_constraintdef(oid))
    from pg_constraint where connamespace = 'public'::regnamespace
    union all
    select 'index ' || indexdef from pg_indexes where schemaname = 'public'
    union all
    select 'trigger ' || pg_get_triggerdef(oid) from pg_trigger where not tgisinternal
    order by 1`);
  return rows.map(({ line }) => line);
}

const sources = path.join(projectRoot(), 'server', 'src');

const tableFiles = readdirSync(sources, { recursive: true, encoding: 'utf8' })
  .filter((file) => file.endsWith('.table.ts'))
  .map((file) => path.join(sources, file));

describe('migrations', () => {
  it('have names that say what they do', () => {
    expect(journal.entries.length).toBeGreaterThan(0);
    for (const { tag, idx } of journal.entries) {
      expect(tag).toMatch(new RegExp(`^${String(idx).padStart(4, '0')}_[a-z]+(-[a-z]+)+$`));
    }
  });

  it('build every table from empty, and again change nothing', async () => {
    const database = await emptyDatabase();
    await migrateDatabase(database.pool);
    const first = await describeSchema(database);
    expect(first.some((line) => line.startsWith('column memberships.role workspace_role'))).toBe(
      true,
    );
    await migrateDatabase(database.pool);
    expect(await describeSchema(database)).toEqual(first);
  });

  it('go on from wherever an older version has stopped', async () => {
    const whole = await emptyDatabase();
    await migrateDatabase(whole.pool);
    const expected = await describeSchema(whole);
    for (let length = 1; length < journal.entries.length; length += 1) {
      const database = await emptyDatabase();
      await migrateDatabase(database.pool, firstMigrations(length));
      expect(await describeSchema(database)).not.toEqual(expected);
      await migrateDatabase(database.pool);
      expect(await describeSchema(database)).toEqual(expected);
    }
  });

  it('run once when several servers start together', async () => {
    const database = await emptyDatabase();
    await Promise.all([1, 2, 3].map(() => migrateDatabase(database.pool)));
    const { rows } = await database.pool.query('select * from drizzle.__drizzle_migrations');
    expect(rows).toHaveLength(journal.entries.length);
  });

  it('leave nothing behind when one fails', async () => {
    const database = await emptyDatabase();
    const folder = firstMigrations(journal.entries.length);
    const last = journal.entries.at(-1)!;
    const file = path.join(folder, `${last.tag}.sql`);
    writeFileSync(file, `${readFileSync(file, 'utf8')}\n--> statement-breakpoint\nselect 1 / 0;`);
    await expect(migrateDatabase(database.pool, folder)).rejects.toThrow();
    await migrateDatabase(database.pool);
    const { rows } = await database.pool.query('select * from drizzle.__drizzle_migrations');
    expect(rows).toHaveLength(journal.entries.length);
  });

  it('say the same as the tables in code', async () => {
    expect(tableFiles.length).toBeGreaterThanOrEqual(8);
    const modules = await Promise.all(
      tableFiles.map(async (file) => (await import(file)) as Record<string, unknown>),
    );
    const tables = Object.assign({}, ...modules) as Record<string, unknown>;
    const last = String(journal.entries.at(-1)!.idx).padStart(4, '0');
    const snapshot = JSON.parse(
      readFileSync(path.join(migrationsFolder(), 'meta', `${last}_snapshot.json`), 'utf8'),
    ) as ReturnType<typeof generateDrizzleJson>;
    expect(await generateMigration(snapshot, generateDrizzleJson(tables, snapshot.id))).toEqual([]);
  });
});
