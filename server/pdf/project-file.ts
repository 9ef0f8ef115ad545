import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** A file of the project, whether this runs from the sources or from the bundle. */
export function projectFile(...path: readonly string[]): string {
  let folder = dirname(fileURLToPath(import.meta.url));
  while (!existsSync(join(folder, 'package.json'))) {
    const parent = dirname(folder);
    if (parent === folder) throw new Error('The project folder with its package.json is missing.');
    folder = parent;
  }
  return join(folder, ...path);
}
