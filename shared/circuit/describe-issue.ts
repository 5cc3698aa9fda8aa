import type { z } from 'zod';

export type Issue = z.core.$ZodIssue;

/** What is wrong with a value of the file and what would be right, for a person; `value` is what stands there. */
export function describeIssue(issue: Issue, value: unknown): string {
  const wanted = describeWanted(issue);
  return value === undefined ? `is missing; it ${wanted}` : `${wanted}; it is ${shown(value)}`;
}

function describeWanted(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_type':
      return `must be ${EXPECTED[issue.expected] ?? `of type ${issue.expected}`}`;
    case 'invalid_value':
      return `must be ${oneOf(issue.values.map(shown))}`;
    case 'too_small':
      if (issue.origin === 'array') return `must hold at least ${issue.minimum}`;
      return `must be ${issue.inclusive ? 'at least' : 'greater than'} ${issue.minimum}`;
    case 'too_big':
      return `must be ${issue.inclusive ? 'at most' : 'less than'} ${issue.maximum}`;
    case 'invalid_union':
      return 'options' in issue && Array.isArray(issue.options)
        ? `must be ${oneOf(issue.options.map(shown))}`
        : 'must be one of the forms the contract allows';
    default:
      return issue.message;
  }
}

const EXPECTED: Readonly<Record<string, string | undefined>> = {
  number: 'a finite number',
  int: 'a whole number',
  string: 'a text',
  object: 'an object',
  array: 'a list',
};

function oneOf(choices: readonly string[]): string {
  return choices.length === 1 ? (choices[0] ?? '') : `one of ${choices.join(', ')}`;
}

/** A value as JSON, cut to a length that fits a message. */
export function shown(value: unknown): string {
  if (typeof value === 'number' && !Number.isFinite(value)) return 'not finite';
  if (typeof value === 'object' && value !== null) return Array.isArray(value) ? 'a list' : 'an object';
  const text = JSON.stringify(value) ?? String(value);
  return text.length > 40 ? `${text.slice(0, 40)}…` : text;
}
