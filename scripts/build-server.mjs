// Bundles the server and its commands; packages stay outside. `node scripts/build-server.mjs`
import { mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { build } from 'esbuild';
import { inRoot } from './places.mjs';

/** Files that run as a process or a worker of their own. */
function entryPoints() {
  const found = ['server/index.ts', ...readdirSync(inRoot('server/cli')).map((name) => `server/cli/${name}`)];
  const visit = (folder) => {
    for (const item of readdirSync(inRoot(folder), { withFileTypes: true })) {
      const name = path.posix.join(folder, item.name);
      if (item.isDirectory()) visit(name);
      else if (item.name.endsWith('-worker.ts')) found.push(name);
    }
  };
  visit('server');
  return found.filter((name) => name.endsWith('.ts'));
}

export async function buildServer() {
  mkdirSync(inRoot('build'), { recursive: true });
  // The bundle is made of ES modules, whatever the packages around it are.
  writeFileSync(inRoot('build/package.json'), '{ "type": "module" }\n');
  await build({
    absWorkingDir: inRoot(),
    entryPoints: entryPoints(),
    outbase: 'server',
    outdir: 'build/server',
    bundle: true,
    packages: 'external',
    platform: 'node',
    target: 'node20',
    format: 'esm',
    splitting: true,
    tsconfig: 'server/tsconfig.json',
    logLevel: 'warning',
  });
}

if (process.argv[1] === new URL(import.meta.url).pathname) await buildServer();
