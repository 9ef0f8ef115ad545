import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The folder of package.json, from the sources and from the bundle alike. */
export const PACKAGE_ROOT = findRoot(dirname(fileURLToPath(import.meta.url)));

function findRoot(folder: string): string {
  const parent = dirname(folder);
  if (existsSync(join(folder, 'package.json')) || parent === folder) return folder;
  return findRoot(parent);
}
