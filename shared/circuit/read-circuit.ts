import { checkFet } from './check-fet';
import { checkPaths, findVoltageLoops, type WiredPart } from './check-topology';
import {
  type CircuitPart,
  circuitHeadSchema,
  netNameSchema,
  type PartKind,
  type ProcessSet,
  partSchema,
  type Spread,
} from './circuit-file';
import { describeIssue, type Issue, shown } from './describe-issue';
import { type Problem, problem } from './problem';
import { emptyRecord } from './record-by-name';
import { TERMINALS, type Terminal } from './terminals';

export const DEFAULT_TEMPERATURE = 27;

/** A circuit that was read and checked: every name resolves and every net has a path to ground. */
export interface Circuit {
  readonly title?: string | undefined;
  readonly ground: string;
  /** °C */
  readonly temperature: number;
  readonly processes: Readonly<Record<string, ProcessSet>>;
  readonly parts: readonly CircuitPart[];
  readonly spread?: Spread | undefined;
}

export type ReadCircuit =
  | { readonly ok: true; readonly circuit: Circuit; readonly warnings: Problem[] }
  | { readonly ok: false; readonly problems: Problem[] };

/** Reads a circuit file that was parsed from JSON. All problems are reported, not only the first, errors before warnings. */
export function readCircuit(input: unknown): ReadCircuit {
  if (!isObject(input)) {
    return { ok: false, problems: [problem('bad-value', `A circuit file is a JSON object; this is ${shown(input)}.`)] };
  }
  const head = circuitHeadSchema.safeParse(input);
  const rawParts: readonly unknown[] = Array.isArray(input.parts) ? input.parts : [];
  const readParts = rawParts.map((part) => partSchema.safeParse(part));
  const problems = [
    ...(head.error?.issues ?? []).flatMap((issue) => headProblems(issue, input)),
    ...readParts.flatMap((read, index) =>
      (read.error?.issues ?? []).flatMap((issue) => partProblems(issue, rawParts[index], index)),
    ),
    ...rawParts.flatMap((part) => (isObject(part) ? checkFet(part, input.processes) : [])),
    ...duplicateRefs(rawParts),
    ...strangeSupplies(input.spread, rawParts),
    ...wiringProblems(rawParts, input),
  ];
  if (head.success && problems.every((one) => one.severity !== 'error')) {
    const { title, ground, temperature = DEFAULT_TEMPERATURE, processes = emptyRecord(), spread } = head.data;
    const parts = readParts.flatMap((read) => (read.success ? [read.data] : []));
    return { ok: true, circuit: { title, ground, temperature, processes, parts, spread }, warnings: problems };
  }
  const errors = problems.filter((one) => one.severity === 'error');
  return { ok: false, problems: [...errors, ...problems.filter((one) => one.severity !== 'error')] };
}

function headProblems(issue: Issue, input: unknown): Problem[] {
  const place = issue.path.map(String).join('.');
  const name = issue.path.at(-1);
  if (issue.code === 'unrecognized_keys') {
    const where = place === '' ? 'The circuit file' : `The circuit file's ${place}`;
    return issue.keys.map((key) =>
      problem('unknown-field', `${where} has no field ${shown(key)}. Remove it or correct its name.`),
    );
  }
  const value = valueAt(input, issue.path);
  const nets = name === 'ground' && typeof value === 'string' ? [value] : [];
  const refs = issue.path[1] === 'supplies' && typeof name === 'string' ? [name] : [];
  return [problem('bad-value', `The circuit file's ${place} ${describeIssue(issue, value)}.`, { refs, nets })];
}

function partProblems(issue: Issue, part: unknown, index: number): Problem[] {
  const refs = refsOf(part);
  const where = refs[0] ?? `Part ${index + 1} of the list`;
  const place = issue.path.map(String).join('.');
  if (issue.code === 'unrecognized_keys') {
    const owner = place === '' ? `kind ${isObject(part) ? part.kind : shown(part)}` : place;
    return issue.keys.map((key) =>
      problem('unknown-field', `${where}: ${owner} has no field ${shown(key)}. Remove it or correct its name.`, {
        refs,
      }),
    );
  }
  if (place === '') return [problem('bad-value', `${where} ${describeIssue(issue, part)}.`, { refs })];
  const value = valueAt(part, issue.path);
  const terminal = Object.values(TERMINALS).some((names) => (names as readonly string[]).includes(place));
  const nets = terminal && typeof value === 'string' ? [value] : [];
  return [problem('bad-value', `${where}: ${place} ${describeIssue(issue, value)}.`, { refs, nets })];
}

function duplicateRefs(rawParts: readonly unknown[]): Problem[] {
  const seen = new Map<string, number>();
  for (const ref of rawParts.flatMap(refsOf)) seen.set(ref, (seen.get(ref) ?? 0) + 1);
  return [...seen].flatMap(([ref, times]) =>
    times === 1
      ? []
      : [problem('duplicate-ref', `${times} parts are called ${ref}. Give each a ref of its own.`, { refs: [ref] })],
  );
}

function strangeSupplies(spread: unknown, rawParts: readonly unknown[]): Problem[] {
  if (!isObject(spread) || !isObject(spread.supplies)) return [];
  const voltageSources = new Set(
    rawParts.filter((part) => isObject(part) && part.kind === 'voltage').flatMap((part) => refsOf(part)),
  );
  return Object.keys(spread.supplies)
    .filter((ref) => !voltageSources.has(ref))
    .map((ref) =>
      problem('bad-value', `spread.supplies names ${ref}, which is no voltage source. Name one, or take it out.`, {
        refs: [ref],
      }),
    );
}

/** The wiring is judged as far as it can be read; a part whose terminals can't might close any gap, so then only loops count. */
function wiringProblems(rawParts: readonly unknown[], input: Record<string, unknown>): Problem[] {
  const wired = rawParts.map(readWiring);
  const readable = wired.filter((part) => part !== null);
  const loops = findVoltageLoops(readable);
  const complete = Array.isArray(input.parts) && readable.length === wired.length;
  const ground = netNameSchema.safeParse(input.ground);
  return complete && ground.success ? [...loops, ...checkPaths(readable, ground.data)] : loops;
}

function readWiring(part: unknown, index: number): WiredPart | null {
  if (!isObject(part) || typeof part.kind !== 'string' || !Object.hasOwn(TERMINALS, part.kind)) return null;
  const kind = part.kind as PartKind;
  const terminals: Terminal[] = [];
  for (const name of TERMINALS[kind]) {
    const net = netNameSchema.safeParse(part[name]);
    if (net.success) terminals.push({ name, net: net.data });
    else if (name !== 'body' || part.body !== undefined) return null;
  }
  return { ref: refsOf(part)[0] ?? `part ${index + 1}`, kind, terminals };
}

function refsOf(part: unknown): string[] {
  return isObject(part) && typeof part.ref === 'string' ? [part.ref.slice(0, 64)] : [];
}

function valueAt(root: unknown, path: readonly PropertyKey[]): unknown {
  let value = root;
  for (const key of path) {
    if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return undefined;
    value = (value as Record<PropertyKey, unknown>)[key];
  }
  return value;
}

export function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
