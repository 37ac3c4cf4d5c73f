// Where things lie; plain Node, so that it works before any package is installed.
import { createHash } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '..');
export const inRoot = (...parts) => path.join(root, ...parts);

/** A folder under var/, made when it is missing. */
export function varFolder(...parts) {
  const folder = inRoot('var', ...parts);
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  return folder;
}

/** One hash over the content of files and folders, to see whether a build is still good. */
export function contentHash(names) {
  const hash = createHash('sha256');
  const visit = (file) => {
    const info = statSync(file, { throwIfNoEntry: false });
    if (info === undefined) return;
    if (info.isDirectory()) {
      for (const name of readdirSync(file).sort()) visit(path.join(file, name));
    } else {
      hash.update(path.relative(root, file)).update('\0').update(readFileSync(file)).update('\0');
    }
  };
  for (const name of names) visit(inRoot(name));
  return hash.digest('hex');
}
