import { z } from 'zod';
import { defineEndpoint } from '@/shared/contract/define-endpoint';
import { idSchema } from '@/shared/contract/fields';
import { noInput } from '@/shared/contract/no-input';
import { roles } from '@/shared/contract/roles';
import { entryStateSchema } from '@/shared/entries/entry';

export const exportTableNames = ['entries', 'forecasts', 'odds', 'fills', 'outcomes'] as const;
export type ExportTableName = (typeof exportTableNames)[number];
export const exportFormats = ['xlsx', 'csv', 'json'] as const;

export const exportQuerySchema = z.strictObject({
  format: z.enum(exportFormats).default('xlsx'),
  /** A CSV file holds one table; the other formats hold all. */
  table: z.enum(exportTableNames).default('entries'),
  state: entryStateSchema.optional(),
  underlyingId: idSchema.optional(),
  tag: z.string().max(40).optional(),
  search: z.string().max(120).optional(),
});
export type ExportQuery = z.output<typeof exportQuerySchema>;

export const exportEndpoints = {
  exportJournal: defineEndpoint({
    name: 'exportJournal',
    method: 'GET',
    path: '/exports/journal',
    summary: 'The entries that fit, with forecasts, odds, fills and outcomes, as a workbook, a CSV table or JSON',
    access: { kind: 'desk', roles, rows: 'shared' },
    params: noInput,
    query: exportQuerySchema,
    body: null,
    needsVersion: false,
    status: 200,
    response: 'stream',
  }),
};
