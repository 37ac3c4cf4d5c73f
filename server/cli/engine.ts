import { once } from 'node:events';
import { createInterface } from 'node:readline';
import { answerLine } from '@/server/cli/engine-commands/answer-line';
import { type EngineCommand } from '@/server/cli/engine-commands/engine-command';
import { forecastCommand } from '@/server/cli/engine-commands/forecast-command';
import { impliedCommand } from '@/server/cli/engine-commands/implied-command';
import { lotsCommand } from '@/server/cli/engine-commands/lots-command';
import { oddsCommand } from '@/server/cli/engine-commands/odds-command';
import { priceCommand } from '@/server/cli/engine-commands/price-command';
import { scoreCommand } from '@/server/cli/engine-commands/score-command';
import { sessionsCommand } from '@/server/cli/engine-commands/sessions-command';
import { symbolCommand } from '@/server/cli/engine-commands/symbol-command';
import { volatilityCommand } from '@/server/cli/engine-commands/volatility-command';

const commands = new Map<string, EngineCommand>([
  ['price', priceCommand],
  ['implied', impliedCommand],
  ['volatility', volatilityCommand],
  ['odds', oddsCommand],
  ['forecast', forecastCommand],
  ['symbol', symbolCommand],
  ['sessions', sessionsCommand],
  ['lots', lotsCommand],
  ['score', scoreCommand],
]);

/** Answers the cases of standard input line by line, no faster than the answers are taken. @returns the exit status. */
async function main(name: string | undefined): Promise<number> {
  const command = commands.get(name ?? '');
  if (command === undefined) {
    process.stderr.write(`Usage: engine ${[...commands.keys()].join('|')} < cases.jsonl\n`);
    return 2;
  }
  let lineNumber = 0;
  let hasRefused = false;
  for await (const line of createInterface({ input: process.stdin, crlfDelay: Infinity })) {
    lineNumber += 1;
    const { text, isRefused } = answerLine(command, line, lineNumber);
    hasRefused ||= isRefused;
    if (!process.stdout.write(`${text}\n`)) await once(process.stdout, 'drain');
  }
  return hasRefused ? 1 : 0;
}

// Whoever reads the answers may stop, as `head` does: then there is nothing left to do.
process.stdout.on('error', (error: NodeJS.ErrnoException) => process.exit(error.code === 'EPIPE' ? 0 : 1));
main(process.argv[2]).then(
  (status) => {
    process.exitCode = status;
  },
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exitCode = 1;
  },
);
