import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { contentHash, inRoot, varFolder } from './places.mjs';
import { isOnPath, run } from './run-command.mjs';

/** Installs the locked packages when they are missing or the lock has changed since. */
export function ensurePackages() {
  const lock = contentHash(['package-lock.json']);
  const stamp = `${varFolder()}/installed-packages`;
  const installed = existsSync(inRoot('node_modules')) && existsSync(stamp) ? readFileSync(stamp, 'utf8') : '';
  if (installed === lock) return;
  console.log('Installing packages (about a minute) …');
  run('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error']);
  writeFileSync(stamp, lock);
}

/** Installs a program from Debian's packages when it is missing and we may; otherwise says the one command to run. */
export function ensureDebianPackage(program, packageName) {
  if (isOnPath(program)) return;
  const command = `apt-get install --yes --no-install-recommends ${packageName}`;
  if (process.getuid?.() !== 0 || !isOnPath('apt-get')) {
    throw new Error(`${packageName} is missing. Install it with: sudo ${command}`);
  }
  console.log(`Installing ${packageName} …`);
  const env = { DEBIAN_FRONTEND: 'noninteractive' };
  run('apt-get', ['update', '-qq'], { env, quiet: true });
  run('apt-get', command.split(' ').slice(1), { env, quiet: true });
}
