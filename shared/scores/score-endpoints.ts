import { z } from 'zod';
import { defineEndpoint } from '@/shared/contract/define-endpoint';
import { idSchema, sessionDateSchema } from '@/shared/contract/fields';
import { noInput } from '@/shared/contract/no-input';
import { roles } from '@/shared/contract/roles';

const number = z.number();
export const scoresSchema = z.strictObject({
  /** Stated odds that are resolved, newest first, at most 500. */
  resolved: z.array(
    z.strictObject({
      entryId: idSchema,
      symbol: z.string(),
      structureName: z.string(),
      traderName: z.string(),
      key: z.string(),
      /** "97 put in the money". */
      statement: z.string(),
      dueSessionDate: sessionDateSchema,
      probability: number,
      marketImplied: number.nullable(),
      happened: z.boolean(),
      brierScore: number,
      isLateSeal: z.boolean(),
    }),
  ),
  /** Scored odds: sealed in time. */
  count: z.int(),
  lateCount: z.int(),
  pendingCount: z.int(),
  /** What may be shown from this many: under 20 a list only. */
  sampleRule: z.enum(['list-only', 'provisional', 'shown']),
  /** Null while the sample rule says list only. */
  summary: z
    .strictObject({
      meanBrierScore: number,
      /** Over the odds that have a market-implied figure; null when none has. */
      marketMeanBrierScore: number.nullable(),
      meanLogScore: number,
      baseRate: number,
      reliability: number,
      resolution: number,
      uncertainty: number,
      /** Bins of equal width that hold at least one forecast; low and high: where 90 % of the frequencies would fall were the odds right. */
      bins: z.array(z.strictObject({ forecast: number, observed: number, count: z.int(), low: number, high: number })),
      curve: z.array(z.strictObject({ forecast: number, observed: number })),
      sentence: z.string(),
    })
    .nullable(),
});
export type Scores = z.infer<typeof scoresSchema>;

export const scoreEndpoints = {
  readScores: defineEndpoint({
    name: 'readScores',
    method: 'GET',
    path: '/scores',
    summary: 'Resolved forecasts and how well the odds came true: one’s own, or for a mentor those of their traders',
    access: { kind: 'desk', roles, rows: 'shared' },
    params: noInput,
    query: noInput,
    body: null,
    needsVersion: false,
    status: 200,
    response: scoresSchema,
  }),
};
