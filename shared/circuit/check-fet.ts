import { type Problem, problem } from './problem';

type Raw = Readonly<Record<string, unknown>>;

/**
 * What the fields of a FET say together: a size of one sort, a process that is there and has its polarity, and every
 * parameter that is required from one place or the other. Works on the file as it stands, so that a FET with an
 * unknown field is still told that its process is missing.
 */
export function checkFet(part: Raw, processes: unknown): Problem[] {
  if (part.kind !== 'nfet' && part.kind !== 'pfet') return [];
  const where = typeof part.ref === 'string' ? part.ref.slice(0, 64) : `A ${part.kind}`;
  const about = { refs: typeof part.ref === 'string' ? [part.ref.slice(0, 64)] : [] };
  const bad = (message: string) => problem('bad-value', `${where}: ${message}`, about);
  return [...checkSize(part, bad), ...checkParameters(part, processes, where, about, bad)];
}

function checkSize(part: Raw, bad: (message: string) => Problem): Problem[] {
  const given = ['width', 'length'].filter((name) => part[name] !== undefined);
  if (part.k !== undefined) {
    if (given.length === 0) return [];
    return [bad(`k together with ${given.join(' and ')}. Give either k, or width and length.`)];
  }
  if (given.length === 2) return [];
  if (given.length === 0) return [bad('it has no size. Give width and length, or k.')];
  return [bad(`${given[0]} without ${given[0] === 'width' ? 'length' : 'width'}. Give both, or k alone.`)];
}

function checkParameters(
  part: Raw,
  processes: unknown,
  where: string,
  about: { refs: string[] },
  bad: (message: string) => Problem,
): Problem[] {
  const polarity = String(part.kind);
  const named = typeof part.process === 'string' ? part.process : undefined;
  const entry = named === undefined ? undefined : ownObject(processes, named);
  const fields = ownObject(entry, polarity);
  if (named !== undefined && fields === undefined) {
    if (isPresent(processes, named) && entry === undefined) return [];
    if (entry && isPresent(entry, polarity)) return [];
    const message = entry
      ? `${where}: the process ${named} has no ${polarity} parameters. Add them, or choose another process.`
      : `${where}: there is no process ${named}. Add it to processes, or name one that is there.`;
    return [problem('unknown-process', message, about)];
  }
  if (part.process !== undefined && named === undefined) return [];
  const has = (name: string) => isPresent(part.overrides, name) || isPresent(fields, name);
  const required = part.width !== undefined && part.length !== undefined ? ['threshold', 'kPrime'] : ['threshold'];
  const missing = required.filter((name) => !has(name));
  // A process without a threshold is reported once, at the process.
  const here = named === undefined ? missing : missing.filter((name) => name !== 'threshold');
  if (here.length === 0) return [];
  return [
    bad(
      named === undefined
        ? `it names no process and its overrides lack ${here.join(' and ')}. Name a process, or give ${here.length === 1 ? 'it' : 'them'} under overrides.`
        : `it has width and length, but neither its overrides nor the process ${named} give kPrime. Give it in one of them.`,
    ),
  ];
}

function isPresent(owner: unknown, name: string): boolean {
  return typeof owner === 'object' && owner !== null && Object.hasOwn(owner, name);
}

function ownObject(owner: unknown, name: string): Raw | undefined {
  if (!isPresent(owner, name)) return undefined;
  const value = (owner as Raw)[name];
  return typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Raw) : undefined;
}
