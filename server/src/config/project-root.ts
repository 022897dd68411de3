import { existsSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** The folder that holds package.json, from sources and from the build alike. */
export function projectRoot(): string {
  let folder = path.dirname(fileURLToPath(import.meta.url));
  while (!existsSync(path.join(folder, 'package.json'))) {
    const parent = path.dirname(folder);
    if (parent === folder) {
      throw new Error('The folder of the product has no package.json.');
    }
    folder = parent;
  }
  return folder;
}
