import { QueryFailedError } from 'typeorm';

/**
 * An error for the log. The database's own message can quote what people stored: there its number and the statement without
 * its parameters say enough.
 */
export function describeFailure(error: unknown): Record<string, unknown> {
  if (error instanceof QueryFailedError) {
    const { driverError, name, query, stack = '' } = error;
    const frames = stack.split('\n').filter((line) => line.startsWith('    at '));
    return { name, number: 'errno' in driverError ? driverError.errno : null, query, stack: frames.join('\n') };
  }
  return error instanceof Error
    ? { name: error.name, message: error.message, stack: error.stack }
    : { value: String(error) };
}
