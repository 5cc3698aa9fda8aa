import { equalityDeep } from 'lib0/function';

/** Stands for a value that several parts do not share. */
export const SEVERAL = Symbol('several');

/** The value that all parts have, if it is one. */
export function commonValue<Part, Value>(
  parts: readonly Part[],
  readValue: (part: Part) => Value,
): Value | typeof SEVERAL | undefined {
  const [first, ...others] = parts.map(readValue);
  return others.every((value) => equalityDeep(value, first)) ? first : SEVERAL;
}
