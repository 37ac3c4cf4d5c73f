import { type z } from 'zod';

/** Computes the result of one case: throws ZodError for a case of the wrong shape, DomainError for one that has no answer. */
export type EngineCommand = (input: unknown) => unknown;

/** A command from the shape of its case and what is computed from it. Numbers are refused when they are not finite. */
export function engineCommand<Schema extends z.ZodType>(
  schema: Schema,
  compute: (input: z.output<Schema>) => unknown,
): EngineCommand {
  return (input) => compute(schema.parse(input));
}
