import { z } from 'zod';

export const severitySchema = z.enum(['error', 'warning', 'note']);
export type Severity = z.infer<typeof severitySchema>;

/** Every problem there is, with how much it matters. */
const SEVERITY_OF = {
  'no-ground': 'error',
  'unknown-process': 'error',
  'duplicate-ref': 'error',
  'unknown-field': 'error',
  'bad-value': 'error',
  'floating-net': 'error',
  'undriven-net': 'warning',
  'voltage-loop': 'error',
  'current-cutset': 'error',
  'no-unique-answer': 'error',
  'no-operating-point': 'error',
  'dangling-terminal': 'warning',
  'reversed-channel': 'note',
  'weak-overdrive': 'note',
  'nearly-on': 'note',
  'body-forward': 'warning',
  'beyond-supplies': 'warning',
  'several-operating-points': 'warning',
  'intent-missed': 'warning',
  'intent-thin': 'warning',
  'high-voltage': 'warning',
} as const satisfies Record<string, Severity>;

export type ProblemCode = keyof typeof SEVERITY_OF;

export const problemCodeSchema = z.enum(Object.keys(SEVERITY_OF) as [ProblemCode, ...ProblemCode[]]);

export const problemSchema = z.strictObject({
  severity: severitySchema,
  code: problemCodeSchema,
  /** For a person: what, where, what to do. */
  message: z.string(),
  refs: z.array(z.string()),
  nets: z.array(z.string()),
});

export type Problem = z.infer<typeof problemSchema>;

/** A problem with the severity its code has, about the parts and nets named. */
export function problem(code: ProblemCode, message: string, about: { refs?: string[]; nets?: string[] } = {}): Problem {
  return { severity: SEVERITY_OF[code], code, message, refs: about.refs ?? [], nets: about.nets ?? [] };
}
