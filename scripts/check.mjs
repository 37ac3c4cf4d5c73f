// `npm run check`: types, lint and boundaries, format, unused code.
import { ensurePackages } from './ensure-packages.mjs';
import { inRoot } from './places.mjs';
import { run } from './run-command.mjs';

ensurePackages();
const tool = (name, ...args) => run(inRoot('node_modules/.bin', name), args, { env: { CI: '1', EXPO_OFFLINE: '1' } });
const steps = [
  ['route types', () => tool('expo', 'customize', 'tsconfig.json')],
  ['types of the client and the engine', () => tool('tsc', '--noEmit')],
  ['types of the server', () => tool('tsc', '-p', 'server')],
  ['lint and import boundaries', () => tool('eslint', '.', '--max-warnings=0')],
  ['format', () => tool('prettier', '--check', '.', '--log-level=warn')],
  ['unused code', () => tool('knip')],
];
for (const [name, step] of steps) {
  console.log(`Checking ${name} …`);
  step();
}
console.log('All checks passed.');
