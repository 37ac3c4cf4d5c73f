import { z } from 'zod';
import { DomainError } from '@/journal/errors/domain-error';
import { type EngineCommand } from '@/server/engine/commands/engine-command';

export interface AnsweredLine {
  /** One line of JSON. */
  readonly text: string;
  readonly isRefused: boolean;
}

/**
 * Answers one line of cases, whatever it holds: a bad one gets an error that names its line.
 * @param lineNumber counted from 1.
 */
export function answerLine(command: EngineCommand, line: string, lineNumber: number): AnsweredLine {
  return answered(() => command(JSON.parse(line)), lineNumber);
}

/**
 * The same for a case that is parsed already.
 * @param caseNumber counted from 1; the answer's `line`.
 */
export function answerCase(command: EngineCommand, input: unknown, caseNumber: number): AnsweredLine {
  return answered(() => command(input), caseNumber);
}

function answered(compute: () => unknown, line: number): AnsweredLine {
  try {
    return { text: JSON.stringify(compute(), finiteOrNamed), isRefused: false };
  } catch (error) {
    return { text: JSON.stringify({ error: { ...refusalOf(error), line } }), isRefused: true };
  }
}

/** JSON has no infinity and would write null for it: a log score can be infinite, and then says so. */
function finiteOrNamed(_key: string, value: unknown): unknown {
  if (Number.isNaN(value)) throw new Error('A result is not a number.');
  return value === Infinity || value === -Infinity ? String(value) : value;
}

function refusalOf(error: unknown): { code: string; message: string } {
  if (error instanceof SyntaxError) return { code: 'json-invalid', message: error.message };
  if (error instanceof DomainError) return { code: error.code, message: error.message };
  if (error instanceof z.ZodError) return { code: 'case-invalid', message: error.issues.map(describeIssue).join('; ') };
  return { code: 'unexpected', message: error instanceof Error ? error.message : String(error) };
}

function describeIssue({ path, message }: z.core.$ZodIssue): string {
  return path.length === 0 ? message : `${path.join('.')}: ${message}`;
}
