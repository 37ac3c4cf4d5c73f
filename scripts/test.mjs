// `npm test`: every suite but load and bench, from a fresh clone. `--only PROJECT [files]` runs a part of one.
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { spawnSync } from 'node:child_process';
import { startDatabase } from './database.mjs';
import { ensureDebianPackage, ensurePackages } from './ensure-packages.mjs';
import { inRoot, root } from './places.mjs';

const [flag, onlyProject, ...onlyFiles] = process.argv.slice(2);
const projects = flag === '--only' ? [onlyProject] : ['engine', 'ui', 'server', 'e2e'];
const needs = {
  database: projects.some((name) => name === 'server' || name === 'e2e'),
  browser: projects.includes('e2e'),
};

ensurePackages();
if (needs.browser) {
  ensureDebianPackage('chromium', 'chromium');
  const { buildWeb } = await import('./build-web.mjs');
  buildWeb();
}
if (needs.database) {
  const { buildServer } = await import('./build-server.mjs');
  await buildServer();
}

const database = needs.database ? await startDatabase('test') : null;
const reports = mkdtempSync(path.join(tmpdir(), 'brierbook-tests-'));
const total = { passed: 0, failed: 0 };
try {
  // Browser runs come alone: they start servers of their own, and two cores do not carry more.
  const groups = [projects.filter((name) => name !== 'e2e'), projects.filter((name) => name === 'e2e')];
  for (const group of groups.filter((names) => names.length > 0)) runJest(group);
} finally {
  rmSync(reports, { recursive: true, force: true });
  if (database?.startedHere) await database.stop();
}
console.log(`${total.passed} passed, ${total.failed} failed`);
process.exit(total.failed > 0 || total.passed === 0 ? 1 : 0);

function runJest(group) {
  const report = path.join(reports, `${group.join('-')}.json`);
  const workers = group.includes('e2e') ? ['--runInBand'] : ['--maxWorkers=2'];
  const args = [
    '--selectProjects',
    ...group,
    ...workers,
    '--json',
    `--outputFile=${report}`,
    ...(onlyFiles.length > 0 ? ['--runTestsByPath', ...onlyFiles] : []),
  ];
  const env = {
    ...process.env,
    TZ: process.env.TZ ?? 'UTC',
    ...(database === null
      ? {}
      : {
          BRIERBOOK_TEST_MIGRATION_URL: database.migrationUrl(''),
          BRIERBOOK_TEST_APPLICATION_URL: database.applicationUrl(''),
          BRIERBOOK_TEST_APPLICATION_ACCOUNT: database.applicationAccount,
        }),
  };
  const { status } = spawnSync(process.execPath, [inRoot('node_modules/jest/bin/jest.js'), ...args], {
    cwd: root,
    env,
    stdio: ['ignore', 'ignore', 'inherit'], // jest reports on the error stream; its JSON goes to the file
  });
  if (!existsSync(report)) {
    total.failed += 1; // jest itself did not come to its end
    return;
  }
  const result = JSON.parse(readFileSync(report, 'utf8'));
  total.passed += result.numPassedTests;
  // A suite that cannot even be loaded, an open handle, a skipped test: none may pass for green.
  total.failed += result.numFailedTests + result.numRuntimeErrorTestSuites + result.numPendingTests;
  if (status !== 0 && result.numFailedTests + result.numRuntimeErrorTestSuites === 0) total.failed += 1;
}
