import { Refusal } from '#shared/api/refusal';
import type { CreateSheetBody, SheetAnswer } from '#shared/api/sheets';
import { circuitFileSchema } from '#shared/circuit/circuit-file';
import type { Drawing } from '#shared/circuit/drawing';
import { drawingOf } from '#shared/circuit/import-drawing';
import type { ProblemCode } from '#shared/circuit/problem';
import { readCircuit } from '#shared/circuit/read-circuit';
import { BLANK_DRAWING, STARTERS } from '#shared/starters/starters';
import { newId } from '../auth/tokens';
import type { Context } from './context';
import { getSheet } from './get-sheet';
import { storeNewSheet } from './store-new-sheet';
import { requireSheet, requireTeam } from './team-access';
import { tellTeam } from './tell-team';

/** Makes a sheet: blank, from a starter, from a circuit file, or as a copy of another as it is drawn now. */
export function createSheet(ctx: Context, teamId: string, body: CreateSheetBody, askerId: string): SheetAnswer {
  requireTeam(ctx.db, teamId, askerId, 'edit-sheet');
  const id = newId();
  const now = ctx.now();
  const sheet = { id, teamId, name: body.name, createdBy: askerId, createdAt: now, changedAt: now };
  storeNewSheet(ctx.db, sheet, drawingFor(ctx, body, askerId));
  tellTeam(ctx, teamId, { kind: 'sheet', teamId, sheetId: id });
  return getSheet(ctx, id, askerId);
}

function drawingFor(ctx: Context, { starter, circuit, copyOf }: CreateSheetBody, askerId: string): Drawing {
  if (copyOf !== undefined) return ctx.rooms.drawing(requireSheet(ctx.db, copyOf, askerId, 'open-sheet').sheet.id);
  if (circuit !== undefined) return importDrawing(circuit);
  if (starter === undefined) return BLANK_DRAWING;
  const found = STARTERS.find(({ id }) => id === starter);
  if (!found) {
    const ids = STARTERS.map(({ id }) => id).join(', ');
    throw new Refusal('invalid', 'There is no such starter.', { fields: { starter: `Choose one of ${ids}.` } });
  }
  return found.drawing;
}

/** Faults of the file itself. A circuit that only lacks a wire can be drawn, and mended on the sheet. */
const UNREADABLE: readonly ProblemCode[] = ['bad-value', 'unknown-field', 'unknown-process', 'duplicate-ref'];
const MOST_TOLD = 20;

function importDrawing(input: unknown): Drawing {
  const read = readCircuit(input);
  const faults = read.ok ? [] : read.problems.filter(({ code }) => UNREADABLE.includes(code));
  if (faults.length > 0) {
    const told = faults.slice(0, MOST_TOLD).map(({ message }) => message);
    if (faults.length > MOST_TOLD) told.push(`And ${faults.length - MOST_TOLD} more.`);
    throw new Refusal('invalid', 'This circuit file cannot be drawn.', { fields: { circuit: told.join('\n') } });
  }
  return drawingOf(circuitFileSchema.parse(input));
}
