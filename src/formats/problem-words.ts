import type { Problem, ProblemCode } from '#shared/circuit/problem';

/** Two or three words for beside a part, where the whole message has no room. */
const IN_SHORT: Record<ProblemCode, string> = {
  'no-ground': 'no ground',
  'unknown-process': 'process unknown',
  'duplicate-ref': 'reference taken',
  'unknown-field': 'field unknown',
  'bad-value': 'value wrong',
  'floating-net': 'net floats',
  'undriven-net': 'net undriven',
  'voltage-loop': 'voltage loop',
  'current-cutset': 'current has no way',
  'no-unique-answer': 'no unique answer',
  'no-operating-point': 'no operating point',
  'dangling-terminal': 'terminal open',
  'reversed-channel': 'channel reversed',
  'weak-overdrive': 'weak overdrive',
  'nearly-on': 'nearly on',
  'body-forward': 'body forward',
  'beyond-supplies': 'beyond supplies',
  'several-operating-points': 'several points',
  'intent-missed': 'intent missed',
  'intent-thin': 'margin thin',
  'high-voltage': 'over 60 V',
};

/** The problem in two or three words, with the net that it is about where there is just one. */
export function problemInShort({ code, nets }: Problem): string {
  const [net] = nets;
  const aboutOneNet = (code === 'floating-net' || code === 'undriven-net') && nets.length === 1;
  return aboutOneNet ? IN_SHORT[code].replace('net', net ?? 'net') : IN_SHORT[code];
}

/** Verdicts have shapes of their own: these are not told a second time beside a part. */
export function isVerdict({ code }: Problem): boolean {
  return code === 'intent-missed' || code === 'intent-thin';
}

const WEIGHT = { error: 0, warning: 1, note: 2 };

/** The gravest first, otherwise in the order in which they were found. */
export function byGravity(problems: readonly Problem[]): Problem[] {
  return [...problems].sort((a, b) => WEIGHT[a.severity] - WEIGHT[b.severity]);
}
