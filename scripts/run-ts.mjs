// Runs a TypeScript file of this repository: `node scripts/run-ts.mjs FILE [ARGUMENTS]`.
import { spawn } from 'node:child_process';
import { inRoot, root } from './places.mjs';

const [file, ...args] = process.argv.slice(2);
if (file === undefined) {
  console.error('Usage: node scripts/run-ts.mjs FILE [ARGUMENTS]');
  process.exit(2);
}
const child = spawn(process.execPath, ['--import', 'tsx', inRoot(file), ...args], {
  cwd: root,
  stdio: 'inherit',
  env: { ...process.env, TSX_TSCONFIG_PATH: inRoot('server/tsconfig.json') },
});
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => child.kill(signal));
child.once('error', (error) => {
  console.error(error.message);
  process.exit(1);
});
child.once('exit', (code, signal) => process.exit(code ?? (signal === null ? 1 : 128)));
