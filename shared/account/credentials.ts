import { z } from 'zod';

/** One plain address: no quotes, no comments, no line breaks, at most 254 characters. */
export const emailSchema = z
  .email('Write an e-mail address such as name@example.org.')
  .max(254)
  .refine((text) => !/["\r\n<>(),;:\\]/.test(text), 'Write a plain address without quotes.');

/** A password being chosen: any characters, 15 to 256 of them, kept exactly as typed. */
export const newPasswordSchema = z
  .string()
  .min(15, 'Use at least 15 characters; a few words in a row are easy to remember.')
  .max(256, 'Use at most 256 characters.');

/** A password being presented: only bounded, so that old rules never lock anyone out. */
export const presentedPasswordSchema = z.string().min(1).max(256);

/** An IANA time zone the runtime knows. */
export const timeZoneSchema = z
  .string()
  .max(64)
  .refine((zone) => {
    try {
      return new Intl.DateTimeFormat('en', { timeZone: zone }).resolvedOptions().timeZone !== '';
    } catch {
      return false; // Intl throws a RangeError for a zone it does not know
    }
  }, 'Choose a time zone from the list.');
