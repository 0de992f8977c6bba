import * as z from 'zod';
import './words';

/** Text of one line: trimmed, not empty. */
export const line = (most = 120) =>
  z
    .string()
    .trim()
    .min(1, 'Fill this in.')
    .max(most, `At most ${most} characters.`)
    .refine((text) => !/[\r\n]/.test(text), 'One line only.');

/** Text of one line that may be left empty. */
export const optionalLine = (most = 120) =>
  z
    .string()
    .trim()
    .max(most, `At most ${most} characters.`)
    .refine((text) => !/[\r\n]/.test(text), 'One line only.');

/** Text of several lines that may be left empty. */
export const prose = (most = 2000) => z.string().trim().max(most, `At most ${most} characters.`);

/** A reason that goes on record: a few words at least. */
export const reason = z.string().trim().min(3, 'Say why in a few words.').max(500, 'At most 500 characters.');

export const mailAddress = z
  .email('This is not an e-mail address.')
  .max(254)
  .transform((text) => text.toLowerCase());

/** A password to be set: length is what counts (NIST SP 800-63B-4 section 3.1.1.2 asks for 15; bcrypt reads 72 bytes). */
export const newPassword = z
  .string()
  .min(15, 'At least 15 characters; a few words in a row do well.')
  .refine((text) => new TextEncoder().encode(text).length <= 72, 'At most 72 bytes.');

export const day = z.iso.date();
export const moment = z.iso.datetime();
export const id = z.int().positive();
export const version = z.int().positive();
export const positive = z.number().positive('Must be more than 0.');
