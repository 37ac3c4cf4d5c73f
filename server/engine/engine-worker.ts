import { answerCase } from '@/server/engine/answer-case';
import { engineCommands } from '@/server/engine/engine-commands';
import { type EngineCommandName } from '@/shared/engine/engine-endpoints';

export interface EngineTask {
  readonly command: EngineCommandName;
  readonly cases: readonly unknown[];
}

/** Runs in a thread of its own: some cases take long and must not hold up other requests. @returns one line of JSON a case. */
export default function runEngineTask({ command, cases }: EngineTask): { text: string; isRefused: boolean }[] {
  const compute = engineCommands.get(command);
  if (compute === undefined) throw new TypeError(`There is no command ${command}.`);
  return cases.map((input, index) => answerCase(compute, input, index + 1));
}
