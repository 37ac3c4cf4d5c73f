import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { contentHash, inRoot, varFolder } from './places.mjs';
import { run } from './run-command.mjs';

const sources = [
  'app',
  'components',
  'hooks',
  'journal',
  'shared',
  'assets',
  'public',
  'app.json',
  'babel.config.js',
  'metro.config.js',
  'tsconfig.json',
  'package-lock.json',
];

/** Exports the web client to dist/ unless its sources are those of the last export. */
export function buildWeb() {
  const hash = contentHash(sources);
  const stamp = `${varFolder()}/web-build`;
  if (existsSync(inRoot('dist', 'index.html')) && existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return;
  console.log('Building the web client (about a minute) …');
  run(inRoot('node_modules/.bin/expo'), ['export', '-p', 'web'], {
    env: { CI: '1', EXPO_OFFLINE: '1', EXPO_NO_TELEMETRY: '1', NODE_ENV: 'production' },
    quiet: true,
  });
  writeFileSync(stamp, hash);
}
