import { z } from 'zod';
import { idSchema, sessionDateSchema } from '@/shared/contract/fields';

export const barColumns = ['date', 'open', 'high', 'low', 'close', 'ignore'] as const;

/** How a file is read: found from the file, and changed by the person where the file leaves a choice. */
export const readingSchema = z.strictObject({
  /** Worksheet name; null for text files. */
  sheet: z.string().max(200).nullable(),
  /** 1-based line or row of the header. */
  headerRow: z.int().min(1),
  /** One meaning a column, in the file's order. */
  columns: z.array(z.enum(barColumns)).max(100),
  /** Null while the dates allow both day-month and month-day and the person has not chosen. */
  dateOrder: z.enum(['year-month-day', 'day-month-year', 'month-day-year']).nullable(),
  decimalMark: z.enum(['point', 'comma']),
});
export type Reading = z.infer<typeof readingSchema>;

export const readingQuestionSchema = z.strictObject({
  about: z.enum(['dateOrder', 'columns', 'sheet', 'decimalMark']),
  /** A sentence that asks, with an example from the file. */
  question: z.string(),
  choices: z.array(z.strictObject({ value: z.string(), label: z.string(), example: z.string() })),
});
export type ReadingQuestion = z.infer<typeof readingQuestionSchema>;

const previewBarSchema = z.strictObject({
  /** 1-based line in the file. */
  row: z.int(),
  sessionDate: sessionDateSchema,
  close: z.string(),
  open: z.string().nullable(),
  high: z.string().nullable(),
  low: z.string().nullable(),
});

export const priceUploadSchema = z.strictObject({
  id: idSchema,
  underlyingId: idSchema,
  fileName: z.string(),
  state: z.enum(['preview', 'committed']),
  /** Names of the worksheets; empty for text files. */
  sheets: z.array(z.string()),
  /** Header texts in the file's order, and a few values under each. */
  headers: z.array(z.strictObject({ text: z.string(), samples: z.array(z.string()) })),
  reading: readingSchema,
  questions: z.array(readingQuestionSchema),
  rowsRead: z.int(),
  /** Sessions that are new to the desk. */
  added: z.int(),
  unchanged: z.int(),
  /** Sessions whose stored close differs from the file's. */
  changes: z.array(z.strictObject({ row: z.int(), sessionDate: sessionDateSchema, from: z.string(), to: z.string() })),
  /** Every row that cannot be taken, with its reason and what to do; the upload is all or nothing. */
  refused: z.array(z.strictObject({ row: z.int(), text: z.string(), column: z.string(), message: z.string() })),
  /** Prices worth a look before committing: far moves, repeated closes, sessions without a range. */
  suspects: z.array(z.strictObject({ row: z.int(), sessionDate: sessionDateSchema, message: z.string() })),
  firstSessionDate: sessionDateSchema.nullable(),
  lastSessionDate: sessionDateSchema.nullable(),
  /** The first and the last few bars as they were read. */
  sample: z.array(previewBarSchema),
  /** True when nothing is asked and nothing refused. */
  canCommit: z.boolean(),
});
export type PriceUpload = z.infer<typeof priceUploadSchema>;
