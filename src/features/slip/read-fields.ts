import { netNameSchema, refSchema } from '#shared/circuit/circuit-file';
import { type ParsedValue, parseValue, type Quantity } from '#shared/units/parse-value';

type Read<T> = { ok: true; value: T } | { ok: false; reason: string };

/** Sizes and component values are more than nothing; sources take any sign. */
export function readPositive(text: string, quantity: Quantity): ParsedValue {
  const reading = parseValue(text, quantity);
  if (reading.ok && reading.value <= 0) return { ok: false, reason: 'This must be more than 0.' };
  return reading;
}

export function readMargin(text: string): ParsedValue {
  const reading = parseValue(text, { unit: 'V' });
  if (reading.ok && reading.value < 0) return { ok: false, reason: 'A margin asked for is 0 or more.' };
  return reading;
}

export function readCount(text: string): Read<number> {
  const count = /^\d{1,6}$/.test(text.trim()) ? Number(text) : 0;
  if (count < 1) return { ok: false, reason: 'A count is a whole number from 1 up.' };
  return { ok: true, value: count };
}

export function readReference(text: string): Read<string> {
  const ref = text.trim();
  if (refSchema.safeParse(ref).success) return { ok: true, value: ref };
  return {
    ok: false,
    reason: 'A reference is a letter followed by letters, digits or _, at most 16 characters, such as Q1.',
  };
}

export function readNetName(text: string): Read<string> {
  const name = text.trim();
  if (netNameSchema.safeParse(name).success) return { ok: true, value: name };
  return { ok: false, reason: 'A net name is 1 to 32 of letters, digits and _ + - . without spaces.' };
}
