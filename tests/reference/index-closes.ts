import { readFileSync } from 'node:fs';
import path from 'node:path';

/** Closes of the published index series beside this file, by name; their source line stands in the file. */
export function indexCloses(series: string): number[] {
  const lines = readFileSync(path.join(__dirname, 'data/eustockmarkets_dax_smi.csv'), 'utf8')
    .split('\n')
    .filter((line) => !line.startsWith('#') && line !== '');
  const column = (lines[0] ?? '').split(',').indexOf(series);
  if (column < 0) throw new Error(`no series ${series}`);
  return lines.slice(1).map((line) => Number(line.split(',')[column]));
}
