import { z } from 'zod';
import { defineEndpoint } from '@/shared/contract/define-endpoint';
import { decimalTextSchema, idSchema, instantSchema, sessionDateSchema } from '@/shared/contract/fields';
import { noInput } from '@/shared/contract/no-input';
import { roles } from '@/shared/contract/roles';
import { entryRowSchema } from '@/shared/entries/entry';

const taskSchema = z.strictObject({
  kind: z.enum([
    'expiring',
    'past-expiry',
    'untraded',
    'missing-prices',
    'missing-settlement',
    'write-lesson',
    'weekly-review',
    'seal-draft',
    'start',
  ]),
  /** When it must be done. */
  group: z.enum(['before-next-open', 'from-today', 'when-ready']),
  title: z.string(),
  why: z.string(),
  /** What a closed entry brought; it stands before the reason. */
  profit: z.strictObject({ realised: decimalTextSchema, currency: z.string() }).nullable(),
  /** The verb on the line. */
  action: z.string(),
  target: z.discriminatedUnion('kind', [
    z.strictObject({
      kind: z.literal('entry'),
      entryId: idSchema,
      section: z.enum(['landing', 'fills', 'lesson', 'seal']),
    }),
    /** The page where bars are uploaded, or the place where the bar of a session is typed. */
    z.strictObject({
      kind: z.literal('underlying'),
      underlyingId: idSchema,
      sessionDate: sessionDateSchema.nullable(),
    }),
    z.strictObject({ kind: z.literal('weekly-review') }),
    z.strictObject({ kind: z.literal('new-underlying') }),
    z.strictObject({ kind: z.literal('new-plan') }),
  ]),
});
export type TodayTask = z.infer<typeof taskSchema>;

export const todaySchema = z.strictObject({
  now: instantSchema,
  /** The session in progress or the last one that closed. */
  session: z.strictObject({ sessionDate: sessionDateSchema, isOver: z.boolean() }),
  nextSession: z.strictObject({ sessionDate: sessionDateSchema, kind: z.enum(['full', 'early']) }),
  tasks: z.array(taskSchema),
  /** Sealed and open entries, nearest exit first. */
  running: z.array(entryRowSchema),
  runningCount: z.int(),
  resolvedOddsCount: z.int(),
  meanBrierScore: z.number().nullable(),
});
export type Today = z.infer<typeof todaySchema>;

export const todayEndpoints = {
  readToday: defineEndpoint({
    name: 'readToday',
    method: 'GET',
    path: '/today',
    summary: 'What needs the reader now, in the order it must be done',
    access: { kind: 'desk', roles, rows: 'shared' },
    params: noInput,
    query: noInput,
    body: null,
    needsVersion: false,
    status: 200,
    response: todaySchema,
  }),
};
