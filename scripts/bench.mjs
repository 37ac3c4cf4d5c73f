// `npm run bench`: runs every tests/bench/*.bench.ts and prints how many times as fast the engine is as its baselines.
// Each is bundled as the server is, since code that runs is code that was bundled.
import { readdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { ensurePackages } from './ensure-packages.mjs';
import { inRoot, varFolder } from './places.mjs';
import { run } from './run-command.mjs';

ensurePackages();
const { build } = await import('esbuild');
const names = readdirSync(inRoot('tests/bench')).filter((name) => name.endsWith('.bench.ts'));
const folder = varFolder('bench');
let missed = 0;
try {
  for (const name of names.sort()) {
    const bundle = path.join(folder, name.replace(/\.ts$/, '.mjs'));
    await build({
      absWorkingDir: inRoot(),
      entryPoints: [`tests/bench/${name}`],
      outfile: bundle,
      bundle: true,
      packages: 'external',
      platform: 'node',
      target: 'node20',
      format: 'esm',
      tsconfig: 'server/tsconfig.json',
      logLevel: 'warning',
    });
    if (!isAimMet(JSON.parse(run(process.execPath, [bundle], { quiet: true })))) missed += 1;
  }
} finally {
  rmSync(folder, { recursive: true, force: true });
}
console.log(missed === 0 ? '\nEvery aim is met.' : `\n${missed} of ${names.length} aims missed.`);

/** Prints one report; its first row is the baseline, the second the one with an aim. */
function isAimMet({ title, aim, rows, skipped }) {
  if (skipped !== undefined) {
    console.log(`\n${title}\n  skipped: ${skipped}`);
    return true;
  }
  const width = Math.max(...rows.map(({ name }) => name.length));
  console.log(`\n${title}`);
  for (const [index, { name, perSecond, ratio }] of rows.entries()) {
    const figures = `${Math.round(perSecond).toLocaleString('en').padStart(14)}${`${ratio.toFixed(ratio < 10 ? 2 : 1)}×`.padStart(10)}`;
    console.log(`  ${name.padEnd(width)}${figures}${index === 1 ? `  (aim ${aim}×)` : ''}`);
  }
  return rows[1].ratio >= aim;
}
