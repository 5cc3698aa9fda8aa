import { z } from 'zod';

/**
 * A JSON object whose keys are names that people chose. Unlike `z.record` it keeps every own key, so that a net or a
 * process called `__proto__` or `constructor` is a name like any other.
 */
export function recordByName<Value extends z.ZodType>(value: Value) {
  return z.unknown().transform((input, context): Record<string, z.output<Value>> => {
    const record = emptyRecord<z.output<Value>>();
    if (typeof input !== 'object' || input === null || Array.isArray(input)) {
      context.issues.push({ code: 'invalid_type', expected: 'object', input });
      return z.NEVER;
    }
    for (const [name, entry] of Object.entries(input)) {
      const read = value.safeParse(entry);
      if (read.success) record[name] = read.data;
      else {
        for (const issue of read.error.issues) {
          context.issues.push({ ...issue, path: [name, ...issue.path] } as z.core.$ZodRawIssue);
        }
      }
    }
    return record;
  });
}

/** An object without a prototype: assigning any name makes an own property and nothing else. */
export function emptyRecord<Value>(): Record<string, Value> {
  return Object.create(null) as Record<string, Value>;
}
