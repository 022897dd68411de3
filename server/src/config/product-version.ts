import { readFileSync } from 'node:fs';
import path from 'node:path';

import { z } from 'zod';

import { projectRoot } from './project-root.js';

const manifest = z.object({ version: z.string() });

/** The version in package.json. */
export const productVersion = (): string =>
  manifest.parse(JSON.parse(readFileSync(path.join(projectRoot(), 'package.json'), 'utf8')))
    .version;
