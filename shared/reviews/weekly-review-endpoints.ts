import { z } from 'zod';
import { defineEndpoint } from '@/shared/contract/define-endpoint';
import {
  decimalTextSchema,
  idSchema,
  instantSchema,
  longTextSchema,
  sessionDateSchema,
} from '@/shared/contract/fields';
import { noInput } from '@/shared/contract/no-input';
import { journalRoles, roles } from '@/shared/contract/roles';
import { entryRowSchema } from '@/shared/entries/entry';

export const ruleActions = ['keep', 'change', 'drop'] as const;
export type RuleAction = (typeof ruleActions)[number];
export const ruleFollowings = ['yes', 'partly', 'no'] as const;
export type RuleFollowing = (typeof ruleFollowings)[number];
export const processMarkNames = ['sealed-before-fill', 'size', 'limit', 'exit'] as const;

const writtenFields = {
  action: z.enum(ruleActions),
  /** The one rule, in the trader's words. */
  rule: longTextSchema.refine((text) => text.trim() !== '', 'Write the rule.'),
  evidence: longTextSchema.refine((text) => text.trim() !== '', 'Write what it rests on.'),
  /** Whether the rule of the week before was followed; null where there was none, or it is not said. */
  followedLast: z.enum(ruleFollowings).nullable(),
};

const reviewSchema = z.strictObject({
  id: idSchema,
  version: z.int().min(1),
  weekStartSessionDate: sessionDateSchema,
  ...writtenFields,
  savedAt: instantSchema,
});
export type WeeklyReview = z.infer<typeof reviewSchema>;

export const reviewedWeekSchema = z.strictObject({
  week: z.strictObject({
    startSessionDate: sessionDateSchema,
    endSessionDate: sessionDateSchema,
    /** Its last session has closed. */
    isOver: z.boolean(),
    /** First sessions of the weeks beside it; null for one that has not begun. */
    previous: sessionDateSchema,
    next: sessionDateSchema.nullable(),
  }),
  /** Whose week it is; null for a mentor without traders. */
  trader: z.strictObject({ id: idSchema, displayName: z.string() }).nullable(),
  /** Whose weeks the reader may look at. */
  traders: z.array(z.strictObject({ id: idSchema, displayName: z.string() })),
  isOwn: z.boolean(),
  sealed: z.array(entryRowSchema),
  closed: z.array(entryRowSchema),
  /** Odds due in the week that have their answer. */
  odds: z.array(
    z.strictObject({
      entryId: idSchema,
      key: z.string(),
      /** "ZZIX bull put 97 / 95". */
      entryName: z.string(),
      statement: z.string(),
      probability: z.number(),
      marketImplied: z.number().nullable(),
      happened: z.boolean(),
      brierScore: z.number(),
    }),
  ),
  /** From 20 odds on; null under that. */
  meanBrierScore: z.number().nullable(),
  /** Of the closed entries: how many kept each mark of the plan, of those where it can be told. */
  process: z.array(z.strictObject({ mark: z.enum(processMarkNames), kept: z.int(), of: z.int() })),
  /** Of the closed entries, by currency. */
  profit: z.array(
    z.strictObject({ currency: z.string(), count: z.int(), expectedMean: z.number(), realised: decimalTextSchema }),
  ),
  review: reviewSchema.nullable(),
  /** The rule written last before this week. */
  lastRule: reviewSchema.nullable(),
});
export type ReviewedWeek = z.infer<typeof reviewedWeekSchema>;

/** A date whose week, and those beside it, the exchange calendar knows. */
const weekSchema = sessionDateSchema.refine(
  (date) => date >= '2000-01-10' && date <= '2099-11-30',
  'The exchange calendar does not know this week.',
);
const own = { kind: 'desk', roles: journalRoles, rows: 'own' } as const;

export const weeklyReviewEndpoints = {
  readWeek: defineEndpoint({
    name: 'readWeek',
    method: 'GET',
    path: '/weekly-review',
    summary:
      'What happened in a week, and the rule written about it: one’s own, or for a mentor those of their traders',
    access: { kind: 'desk', roles, rows: 'shared' },
    params: noInput,
    query: z.strictObject({
      /** Any date of the week; the week of the last closed session unless told. */
      week: weekSchema.optional(),
      traderId: idSchema.optional(),
    }),
    body: null,
    needsVersion: false,
    status: 200,
    response: reviewedWeekSchema,
  }),
  createWeeklyReview: defineEndpoint({
    name: 'createWeeklyReview',
    method: 'POST',
    path: '/weekly-reviews',
    summary: 'Write the rule of a week; the same id again changes nothing',
    access: own,
    params: noInput,
    query: noInput,
    body: z.strictObject({ id: idSchema, week: weekSchema, ...writtenFields }),
    needsVersion: false,
    status: 201,
    response: reviewedWeekSchema,
  }),
  editWeeklyReview: defineEndpoint({
    name: 'editWeeklyReview',
    method: 'PUT',
    path: '/weekly-reviews/:reviewId',
    summary: 'Rewrite the rule of a week',
    access: own,
    params: z.strictObject({ reviewId: idSchema }),
    query: noInput,
    body: z.strictObject(writtenFields),
    needsVersion: true,
    status: 200,
    response: reviewedWeekSchema,
  }),
};
