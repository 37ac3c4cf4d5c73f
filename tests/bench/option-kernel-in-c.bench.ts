import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { europeanValueColumns, valueColumns } from '@/journal/pricing/european-columns';
import { columnsOf } from '@/tests/bench/column-options';
import { compareSpeed } from '@/tests/bench/compare-speed';
import { randomOptions } from '@/tests/bench/random-options';
import { repeatColumns } from '@/tests/bench/repeat';
import { reportSkipped, reportSpeed } from '@/tests/bench/report-speed';

const title = 'European options a second: price, five Greeks, odds, against C (-O2, erfc of its library)';
const options = randomOptions(1024);
const columns = columnsOf(options);
const values = valueColumns(options.length);
const fill = () => {
  europeanValueColumns(columns, values, 1 / 365);
  return values.price[0] ?? NaN;
};

const folder = mkdtempSync(path.join(tmpdir(), 'option-kernel-'));
try {
  const program = path.join(folder, 'option-kernel');
  const compiled = spawnSync('cc', ['-O2', '-o', program, 'tests/bench/option-kernel.c', '-lm'], { encoding: 'utf8' });
  if (compiled.error !== undefined) reportSkipped({ title, skipped: 'no C compiler (cc) is at hand' });
  else if (compiled.status !== 0) throw new Error(compiled.stderr);
  else {
    const runInC = () => {
      const { stdout } = spawnSync(program, ['0.06'], { encoding: 'utf8' });
      const [perSecond = NaN, sum = NaN] = stdout.split(' ').map(Number);
      return { perSecond, sum };
    };
    fill();
    const figures: readonly Float64Array[] = Object.values(values);
    const ours = figures.reduce((sum, column) => column.reduce((total, figure) => total + figure, sum), 0);
    const { sum } = runInC();
    if (!(Math.abs(ours / sum - 1) < 1e-12)) throw new Error(`C sums to ${sum}, the engine to ${ours}.`);
    const rows = compareSpeed({ name: 'C', measurePerSecond: () => runInC().perSecond }, [
      {
        name: 'the engine, in columns',
        work: repeatColumns(options.length, fill),
      },
    ]);
    reportSpeed({ title, aim: 0.8, rows });
  }
} finally {
  rmSync(folder, { recursive: true, force: true });
}
