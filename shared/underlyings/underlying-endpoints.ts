import { z } from 'zod';
import { defineEndpoint } from '@/shared/contract/define-endpoint';
import { idSchema, sessionDateSchema } from '@/shared/contract/fields';
import { noInput } from '@/shared/contract/no-input';
import { journalRoles, roles } from '@/shared/contract/roles';
import { barFields, barSchema, underlyingFields, underlyingSchema } from '@/shared/underlyings/underlying';

const underlyingParams = z.strictObject({ underlyingId: idSchema });

const listedUnderlyingSchema = z.strictObject({
  underlying: underlyingSchema,
  barCount: z.int(),
  lastBar: barSchema.nullable(),
  /** Close of the session before the last bar; null with fewer than two bars. */
  previousClose: z.string().nullable(),
  /** Sessions that have closed since the last bar. */
  sessionsBehind: z.int(),
  /** Volatility of the last 21 returns and its place among its own past year's values; null with too few bars. */
  volatility: z
    .strictObject({
      dailyVolatility: z.number(),
      percentile: z.number(),
      lowerQuartile: z.number(),
      upperQuartile: z.number(),
      lowest: z.number(),
      highest: z.number(),
    })
    .nullable(),
});
export type ListedUnderlying = z.infer<typeof listedUnderlyingSchema>;

const underlyingDetailSchema = z.strictObject({
  underlying: underlyingSchema,
  /** Oldest first. */
  bars: z.array(barSchema),
  /** All bars kept, of which `bars` are the newest. */
  barCount: z.int(),
  sessionsBehind: z.int(),
});
export type UnderlyingDetail = z.infer<typeof underlyingDetailSchema>;

const desk = (access: 'read' | 'write') =>
  ({ kind: 'desk', roles: access === 'read' ? roles : journalRoles, rows: 'desk' }) as const;

export const underlyingEndpoints = {
  listUnderlyings: defineEndpoint({
    name: 'listUnderlyings',
    method: 'GET',
    path: '/underlyings',
    summary: 'Underlyings of the desk with last bar, freshness and volatility',
    access: desk('read'),
    params: noInput,
    query: noInput,
    body: null,
    needsVersion: false,
    status: 200,
    response: z.strictObject({ underlyings: z.array(listedUnderlyingSchema) }),
  }),
  createUnderlying: defineEndpoint({
    name: 'createUnderlying',
    method: 'POST',
    path: '/underlyings',
    summary: 'Add an underlying to the desk',
    access: desk('write'),
    params: noInput,
    query: noInput,
    body: z.strictObject({ id: idSchema, ...underlyingFields }),
    needsVersion: false,
    status: 201,
    response: underlyingSchema,
  }),
  readUnderlying: defineEndpoint({
    name: 'readUnderlying',
    method: 'GET',
    path: '/underlyings/:underlyingId',
    summary: 'One underlying with its newest bars',
    access: desk('read'),
    params: underlyingParams,
    query: z.strictObject({ bars: z.coerce.number().int().min(1).max(2600).default(520) }),
    body: null,
    needsVersion: false,
    status: 200,
    response: underlyingDetailSchema,
  }),
  editUnderlying: defineEndpoint({
    name: 'editUnderlying',
    method: 'PATCH',
    path: '/underlyings/:underlyingId',
    summary: 'Change an underlying',
    access: desk('write'),
    params: underlyingParams,
    query: noInput,
    body: z.strictObject(underlyingFields),
    needsVersion: true,
    status: 200,
    response: underlyingSchema,
  }),
  putBar: defineEndpoint({
    name: 'putBar',
    method: 'PUT',
    path: '/underlyings/:underlyingId/bars/:sessionDate',
    summary: 'Type the bar of one session; the same values again change nothing',
    access: desk('write'),
    params: underlyingParams.extend({ sessionDate: sessionDateSchema }),
    query: noInput,
    body: z.strictObject(barFields),
    needsVersion: false,
    status: 200,
    response: barSchema,
  }),
};
