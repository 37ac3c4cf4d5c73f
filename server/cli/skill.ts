import { readFileSync } from 'node:fs';
import path from 'node:path';
import { readSeriesFile } from '@/server/skill/read-series-file';
import { seriesSkill } from '@/server/skill/series-skill';
import { skillTable } from '@/server/skill/skill-table';

const REFERENCE_FILE = 'tests/reference/data/eustockmarkets_dax_smi.csv';

/** Walks the forecasts of volatility over the series of a file and prints how each method did. */
function main(args: readonly string[]): void {
  const isJson = args.includes('--json');
  const [file, ...rest] = args.filter((argument) => argument !== '--json');
  if (rest.length > 0 || file?.startsWith('-'))
    throw new Error(
      'Usage: skill [--json] [FILE.csv]\nFILE.csv: a header, a session column, one column of closes a series.',
    );
  // npm runs scripts from the root; a name that was typed belongs to the folder it was typed in.
  const place = file === undefined ? REFERENCE_FILE : path.resolve(process.env.INIT_CWD ?? process.cwd(), file);
  const fileName = file ?? REFERENCE_FILE;
  const skills: { series: string; rows: ReturnType<typeof seriesSkill> }[] = [];
  for (const one of readSeriesFile(readText(place, fileName), fileName)) {
    const rows = seriesSkill(one, fileName);
    if (isJson) for (const row of rows) process.stdout.write(`${JSON.stringify({ series: one.series, ...row })}\n`);
    skills.push({ series: one.series, rows });
  }
  if (isJson) return;
  process.stdout.write(
    `${skillTable(skills).join('\n')}\n* the default; log score in nats, more is better; CRPS, less is better\n`,
  );
}

function readText(place: string, fileName: string): string {
  try {
    return readFileSync(place, 'utf8');
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    throw new Error(`${fileName}: it cannot be read (${reason}). Check its name.`, { cause: error });
  }
}

// Whoever reads the rows may stop, as `head` does: then there is nothing left to do.
process.stdout.on('error', (error: NodeJS.ErrnoException) => process.exit(error.code === 'EPIPE' ? 0 : 1));
try {
  main(process.argv.slice(2));
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
}
