import { type z } from 'zod';
import { ApiFailure } from '@/server/errors/api-failure';

/** The validated copy of what was sent. @throws {ApiFailure} `input-invalid` with every problem and its path. */
export function readInput<Schema extends z.ZodType>(schema: Schema, sent: unknown): z.output<Schema> {
  const result = schema.safeParse(sent);
  if (result.success) return result.data;
  const problems = result.error.issues.map((issue) => ({
    field: issue.path.join('.'),
    message:
      issue.code === 'unrecognized_keys'
        ? `Unknown: ${issue.keys.map((key) => key.slice(0, 60)).join(', ')}.`
        : issue.message,
  }));
  throw new ApiFailure('input-invalid', 'Some fields need correcting.', problems);
}
