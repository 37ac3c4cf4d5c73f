import { once } from 'node:events';
import { createInterface } from 'node:readline';
import { answerLine } from '@/server/engine/answer-case';
import { engineCommands } from '@/server/engine/engine-commands';

/** Answers the cases of standard input line by line, no faster than the answers are taken. @returns the exit status. */
async function main(name: string | undefined): Promise<number> {
  const command = engineCommands.get(name ?? '');
  if (command === undefined) {
    process.stderr.write(`Usage: engine ${[...engineCommands.keys()].join('|')} < cases.jsonl\n`);
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
