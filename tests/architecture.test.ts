import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

import { describe, expect, it } from 'vitest';

const root = fileURLToPath(new URL('..', import.meta.url));

interface Source {
  readonly file: string;
  readonly text: string;
  readonly imports: readonly string[];
}

const importPattern = /(?:from|import)\s*\(?\s*['"]([^'"]+)['"]/g;

function sourcesBelow(folder: string): Source[] {
  return readdirSync(path.join(root, folder), { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile() && /\.tsx?$/.test(entry.name))
    .map((entry) => path.join(entry.parentPath, entry.name))
    .map((file) => {
      const text = readFileSync(file, 'utf8');
      const imports = [...text.matchAll(importPattern)].map((match) => match[1]!);
      return { file: path.relative(root, file), text, imports };
    });
}

const isTest = ({ file }: Source) => /\.test\.tsx?$/.test(file);
const all = ['common', 'server/src', 'client/src'].flatMap(sourcesBelow);
const shipped = all.filter((source) => !isTest(source));

/** Files below a folder that import something a pattern forbids. */
function offenders(folder: string, forbidden: RegExp): string[] {
  return shipped
    .filter(({ file }) => file.startsWith(folder))
    .flatMap(({ file, imports }) =>
      imports.filter((name) => forbidden.test(name)).map((name) => `${file} imports ${name}`),
    );
}

describe('import directions', () => {
  it('looks at the whole tree', () => {
    expect(shipped.length).toBeGreaterThan(150);
  });

  it.each([
    ['common/', /^(#server|#client|#tests|@nestjs|drizzle|react|three|node:|pg$|express)/],
    ['client/src/', /^(#server|#tests|@nestjs|drizzle|node:)/],
    ['server/src/', /^(#client|#tests|react|three)/],
    ['server/src/electrostatics/engine/', /^(@nestjs|drizzle|node:|zod)/],
    ['server/src/energetics/engine/', /^(@nestjs|drizzle|node:|zod)/],
    ['server/src/cif/format/', /^(@nestjs|drizzle|node:)/],
    ['client/src/scene/', /(^|\/)(features|routes|app)\//],
    ['client/src/scene/model/', /^(react|three|@react-three)/],
    ['client/src/components/', /(^|\/)(features|routes|app)\//],
    ['client/src/lib/', /(^|\/)(features|routes|app|components|scene)\//],
  ])('%s keeps its side', (folder, forbidden) => {
    expect(shipped.some(({ file }) => file.startsWith(folder))).toBe(true);
    expect(offenders(folder, forbidden)).toEqual([]);
  });

  it('lets only repositories, tables and the database folder touch SQL', () => {
    const touching = shipped.filter(
      ({ file, imports }) =>
        file.startsWith('server/src/') &&
        !/(\.repository|\.table)\.ts$/.test(file) &&
        !file.startsWith('server/src/database/') &&
        imports.some((name) => /^(drizzle-orm|pg$)/.test(name)),
    );
    expect(touching.map(({ file }) => file)).toEqual([]);
  });

  it('has no barrels', () => {
    const barrels = shipped.filter(
      ({ file }) =>
        /\/index\.tsx?$/.test(file) && !/(electrostatics|energetics)\/engine\//.test(file),
    );
    expect(barrels.map(({ file }) => file)).toEqual([]);
  });
});

describe('size of files', () => {
  it('stops at 400 lines, 600 where one algorithm fills a file', () => {
    const long = shipped
      .map(({ file, text }) => ({ file, lines: text.split('\n').length }))
      .filter(({ file, lines }) =>
        /(electrostatics|energetics)\/engine\/|scene\/raster\//.test(file)
          ? lines > 600
          : lines > 400,
      );
    expect(long).toEqual([]);
  });
});

describe('the shipped text', () => {
  it('leaves no skipped test behind', () => {
    const skipped = all.filter(({ text }) => /\b(it|test|describe)\.(skip|only|todo)\(/.test(text));
    expect(skipped.map(({ file }) => file)).toEqual([]);
  });
});
