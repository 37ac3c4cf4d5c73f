import { z } from 'zod';
import { defineEndpoint } from '@/shared/contract/define-endpoint';
import { noInput } from '@/shared/contract/no-input';

export const engineCommandNames = [
  'price',
  'implied',
  'volatility',
  'odds',
  'forecast',
  'symbol',
  'sessions',
  'lots',
  'score',
] as const;
export type EngineCommandName = (typeof engineCommandNames)[number];

const mostCases = 500;

/** One answer a case, in order: its result, or why it has none. */
export const engineAnswersSchema = z.strictObject({
  answers: z.array(
    z.union([
      z.strictObject({ result: z.record(z.string(), z.unknown()) }),
      // `line` is the number of the case, from 1.
      z.strictObject({ error: z.strictObject({ code: z.string(), message: z.string(), line: z.int() }) }),
    ]),
  ),
});
export type EngineAnswers = z.infer<typeof engineAnswersSchema>;

export const engineEndpoints = {
  computeCases: defineEndpoint({
    name: 'computeCases',
    method: 'POST',
    path: '/engine/:command',
    summary:
      'Answers cases of the headless engine, each by itself: a case that has no answer says why and stops no other',
    access: { kind: 'signedIn' },
    params: z.strictObject({ command: z.enum(engineCommandNames) }),
    query: noInput,
    body: z.strictObject({ cases: z.array(z.unknown()).min(1).max(mostCases) }),
    needsVersion: false,
    status: 200,
    response: engineAnswersSchema,
  }),
};
