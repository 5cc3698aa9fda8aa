import { z } from 'zod';
import { ROLES } from '../access/roles';

// Control and bidirectional-override characters let one name pass for another.
const UNPRINTABLE = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]/u;

/** A name people read (of a person, a team, a sheet): trimmed, 1 to 80 characters, one line. */
export const nameField = z
  .string()
  .transform((text) => text.normalize('NFC').trim())
  .pipe(
    z
      .string()
      .min(1, 'Give a name.')
      .max(80, 'At most 80 characters.')
      .refine((text) => !UNPRINTABLE.test(text), 'Leave out control characters.'),
  );

/** An e-mail address, lower-cased: two spellings that differ in case are one account. */
export const emailField = z
  .string()
  .transform((text) => text.normalize('NFC').trim().toLowerCase())
  .pipe(z.string().max(254, 'At most 254 characters.').pipe(z.email('This is not an e-mail address.')));

export const roleField = z.enum(ROLES, 'Choose viewer, reviewer, designer or owner.');

/** The secret part of a link. */
export const tokenField = z.string().min(1, 'The link is incomplete.').max(200, 'This is not one of our links.');

/** An opaque id. */
export const idField = z.string().min(1).max(64);

/** ISO 8601, UTC. */
export const timeField = z.iso.datetime();
