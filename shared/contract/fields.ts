import { z } from 'zod';
import { isSessionDate } from '@/journal/sessions/session-date';

/** Identifiers are UUIDs; the client makes those of rows it creates, so that a repeated request changes nothing. */
export const idSchema = z.uuid();

/** A decimal number as text, exactly as it is stored; never a JSON number. */
export const decimalTextSchema = z
  .string()
  .max(40)
  .regex(/^-?\d{1,18}(\.\d{1,12})?$/, 'Write a plain decimal number such as 12.50.');
export const positiveDecimalSchema = decimalTextSchema.refine(
  (text) => !text.startsWith('-') && /[1-9]/.test(text),
  'Must be above 0.',
);
export const nonNegativeDecimalSchema = decimalTextSchema.refine((text) => !text.startsWith('-'), 'Must be 0 or more.');

/** A day of the exchange's calendar, 'YYYY-MM-DD'. */
export const sessionDateSchema = z.string().refine(isSessionDate, 'Write an existing date as YYYY-MM-DD.');

/** A moment in UTC, ISO 8601 with milliseconds. */
export const instantSchema = z.iso.datetime({ precision: 3 });

/** A person's own words: trimmed length up to 10,000 characters. */
export const longTextSchema = z.string().max(10_000);
export const shortTextSchema = z.string().trim().min(1).max(120);

export const currencySchema = z.string().regex(/^[A-Z]{3}$/, 'Three letters of ISO 4217, such as USD.');
export const fractionSchema = z.number().min(0).max(1);
