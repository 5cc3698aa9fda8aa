import { z } from 'zod';
import { type CircuitFile, circuitFileSchema, type ProcessSet, processSetSchema } from './circuit-file';
import {
  type Drawing,
  type DrawnPart,
  drawnPartSchema,
  hasPin,
  isComponent,
  isFet,
  type PartId,
  type Wire,
  wireSchema,
} from './drawing';
import { enclosedJunctions } from './enclosed-junctions';
import { drawingOf } from './import-drawing';
import { readCircuit } from './read-circuit';
import { emptyRecord, recordByName } from './record-by-name';

const CLIP_FORMAT = 'stillpoint.clip';
/** Longest text that is read, in characters; 60 FETs with their wires come to about 40,000. */
const LONGEST_TEXT = 1_000_000;
const MOST_PARTS = 2000;
const MOST_WIRES = 4000;

const clipSchema = z
  .strictObject({
    format: z.literal(CLIP_FORMAT),
    version: z.literal(1),
    parts: z.array(drawnPartSchema).min(1).max(MOST_PARTS),
    wires: z.array(wireSchema).max(MOST_WIRES),
    processes: recordByName(processSetSchema),
  })
  .superRefine((clip, context) => {
    const fault = faultIn(clip);
    if (fault !== undefined) context.addIssue({ code: 'custom', message: fault });
  });

/** Parts with the wires between them and the processes they use, as they travel from sheet to sheet. */
export type Clip = {
  readonly parts: readonly DrawnPart[];
  readonly wires: readonly Wire[];
  readonly processes: Readonly<Record<string, ProcessSet>>;
};

/** A copy of some parts of a drawing, with whatever lies wholly between them. */
export function clipOf(drawing: Drawing, chosen: ReadonlySet<PartId>): Clip {
  const inside = new Set([...chosen, ...enclosedJunctions(drawing, chosen)]);
  const parts = drawing.parts.filter(({ id }) => inside.has(id));
  const processes = emptyRecord<ProcessSet>();
  for (const part of parts) {
    const name = isFet(part) ? part.values.process : undefined;
    const process = name === undefined ? undefined : own(drawing.settings.processes, name);
    if (name !== undefined && process) processes[name] = process;
  }
  return {
    parts,
    wires: drawing.wires.filter(({ from, to }) => inside.has(from.part) && inside.has(to.part)),
    processes,
  };
}

/** The clip as the text that the clipboard carries. */
export function clipText({ parts, wires, processes }: Clip): string {
  return JSON.stringify({ format: CLIP_FORMAT, version: 1, parts, wires, processes });
}

export type ReadClip = { readonly ok: true; readonly clip: Clip } | { readonly ok: false; readonly reason: string };

const COPY_SOMETHING_ELSE = 'Copy parts on a sheet, or the text of a circuit file, and paste again.';

/** Reads text from the clipboard: a clip, or a circuit file, which is laid out. */
export function readClip(text: string): ReadClip {
  if (text.length > LONGEST_TEXT) return refused('The clipboard holds more than 1 MB.');
  if (text.trim() === '') return refused('The clipboard holds no text.');
  let input: unknown;
  try {
    input = JSON.parse(text);
  } catch {
    return refused('The clipboard holds something other than parts of a sheet.');
  }
  const format = typeof input === 'object' && input !== null && 'format' in input ? input.format : undefined;
  if (format === CLIP_FORMAT) {
    const read = clipSchema.safeParse(input);
    if (read.success) return { ok: true, clip: read.data };
    const [issue] = read.error.issues;
    const where = issue?.path.length ? ` at ${issue.path.join('.')}` : '';
    return refused(`The parts on the clipboard are damaged${where}: ${issue?.message ?? 'they cannot be read'}.`);
  }
  const circuit = circuitFileSchema.safeParse(input);
  if (circuit.success) return circuitClip(circuit.data);
  if (format !== 'stillpoint.circuit') return refused('The clipboard holds something other than parts of a sheet.');
  const checked = readCircuit(input);
  const reason = checked.ok ? undefined : checked.problems.find(({ severity }) => severity === 'error')?.message;
  return { ok: false, reason: `The circuit file on the clipboard cannot be read: ${reason ?? 'a value is wrong.'}` };
}

function circuitClip(circuit: CircuitFile): ReadClip {
  const refs = circuit.parts.map(({ ref }) => ref);
  const doubled = refs.find((ref, index) => refs.indexOf(ref) !== index);
  if (doubled !== undefined)
    return {
      ok: false,
      reason: `The circuit file on the clipboard calls two parts ${doubled}: give each its own ref.`,
    };
  if (refs.length === 0) return refused('The circuit file on the clipboard has no parts.');
  if (refs.length > MOST_PARTS) return refused(`The circuit file on the clipboard has over ${MOST_PARTS} parts.`);
  const drawing = drawingOf(circuit);
  return { ok: true, clip: clipOf(drawing, new Set(drawing.parts.map(({ id }) => id))) };
}

function refused(what: string): ReadClip {
  return { ok: false, reason: `${what} ${COPY_SOMETHING_ELSE}` };
}

function faultIn({ parts, wires }: Pick<Clip, 'parts' | 'wires'>): string | undefined {
  const byId = new Map<string, DrawnPart>(parts.map((part) => [part.id, part]));
  const refs = parts.filter(isComponent).map(({ ref }) => ref);
  if (byId.size < parts.length || new Set(wires.map(({ id }) => id)).size < wires.length)
    return 'two things have one id';
  if (new Set(refs).size < refs.length) return 'two parts have one reference';
  for (const { from, to } of wires) {
    for (const end of [from, to]) {
      const part = byId.get(end.part);
      if (!part || !hasPin(part, end.pin)) return 'a wire ends nowhere';
    }
  }
  return undefined;
}

function own<T>(record: Readonly<Record<string, T>>, name: string): T | undefined {
  return Object.hasOwn(record, name) ? record[name] : undefined;
}
