import { describe, expect, test } from 'vitest';
import * as Y from 'yjs';
import { type Clip, clipOf, clipText, readClip } from '#shared/circuit/clip';
import { besideModel, middleAt } from '#shared/circuit/copy-spot';
import { type DrawnPart, isComponent, isFet, type PartId, partIdSchema } from '#shared/circuit/drawing';
import { membersDiffer } from '#shared/circuit/match-group';
import { netlist } from '#shared/circuit/netlist';
import { setReference, setValues } from '#shared/doc/commands';
import { insertClip } from '#shared/doc/insert-clip';
import { equalise, matchParts, unmatchParts } from '#shared/doc/match';
import { readDrawing } from '#shared/doc/read-drawing';
import { renumber } from '#shared/doc/renumber';
import { OWN_EDIT, sheetMaps } from '#shared/doc/sheet-maps';
import { writeDrawing } from '#shared/doc/write-drawing';
import { shiftedBy } from '#shared/geometry/carry';
import { differentialPair } from '#shared/starters/differential-pair';
import { BLANK_DRAWING } from '#shared/starters/starters';

let ids = 0;
const newId = () => `new-${++ids}`;
const id = (text: string) => partIdSchema.parse(text);

function open(drawing = differentialPair()) {
  const doc = new Y.Doc();
  writeDrawing(doc, drawing);
  const undo = new Y.UndoManager(Object.values(sheetMaps(doc)), {
    trackedOrigins: new Set([OWN_EDIT]),
    captureTimeout: 0,
  });
  return { doc, undo, read: () => readDrawing(doc).drawing };
}
function exchange(a: Y.Doc, b: Y.Doc): void {
  Y.applyUpdate(b, Y.encodeStateAsUpdate(a, Y.encodeStateVector(b)));
  Y.applyUpdate(a, Y.encodeStateAsUpdate(b, Y.encodeStateVector(a)));
}
const named = (parts: readonly DrawnPart[], ref: string) => {
  const part = parts.filter(isComponent).find((one) => one.ref === ref);
  if (!part) throw new Error(`no ${ref}`);
  return part;
};
const refsOf = (parts: readonly DrawnPart[], among: ReadonlySet<PartId>) =>
  parts
    .filter((part) => among.has(part.id))
    .filter(isComponent)
    .map(({ ref }) => ref)
    .sort();
const put = (doc: Y.Doc, clip: Clip, carry = shiftedBy({ x: 2000, y: 0 })) => {
  const inserted = insertClip(doc, clip, carry, newId);
  if (!inserted.ok) throw new Error(inserted.reason);
  return inserted;
};

describe('a copy', () => {
  test('takes the wires and the junctions between its parts, and nothing that leads out', () => {
    const clip = clipOf(differentialPair(), new Set(['Q1', 'Q2', 'Q6'].map(id)));
    expect(clip.parts.filter(({ kind }) => kind === 'junction')).toHaveLength(1);
    expect(clip.wires).toHaveLength(3);
    expect(Object.keys(clip.processes)).toEqual(['buoy-3']);
  });

  test('of a whole sheet pasted into an empty one is the same circuit', () => {
    const whole = differentialPair();
    const { doc, read } = open({ ...BLANK_DRAWING, settings: { ...BLANK_DRAWING.settings, processes: {} } });
    const text = clipText(clipOf(whole, new Set(whole.parts.map((part) => part.id))));
    const clip = readClip(text);
    if (!clip.ok) throw new Error(clip.reason);
    put(doc, clip.clip);
    expect(netlist(read()).circuit.parts).toEqual(netlist(whole).circuit.parts);
    expect(Object.keys(read().settings.processes)).toEqual(['buoy-3']);
  });

  test('takes the next free references, and is undone in one step while a colleague’s edit stays', () => {
    const { doc, undo, read } = open();
    const before = read();
    const colleague = new Y.Doc();
    exchange(doc, colleague);
    const { parts } = put(doc, clipOf(before, new Set(['Q1', 'R1'].map(id))));
    setValues(colleague, new Map([[id('R1'), { resistance: 33e3 }]]));
    exchange(doc, colleague);
    expect(refsOf(read().parts, parts)).toEqual(['Q7', 'R3']);
    expect(refsOf(readDrawing(colleague).drawing.parts, parts)).toEqual(['Q7', 'R3']);
    undo.undo();
    expect(read().parts).toHaveLength(before.parts.length);
    expect(named(read().parts, 'R1')).toMatchObject({ values: { resistance: 33e3 } });
  });

  test('brings a process under a new name where the sheet’s of that name differs', () => {
    const whole = differentialPair();
    const own = { 'buoy-3': { nfet: { threshold: 0.6, kPrime: 1e-4 } } };
    const { doc, read } = open({ ...BLANK_DRAWING, settings: { ...BLANK_DRAWING.settings, processes: own } });
    const inserted = put(doc, clipOf(whole, new Set([id('Q1')])));
    expect(inserted.renamedProcesses).toEqual([{ from: 'buoy-3', to: 'buoy-3-2' }]);
    expect(named(read().parts, 'Q1')).toMatchObject({ values: { process: 'buoy-3-2' } });
    expect(read().settings.processes).toEqual({ ...own, 'buoy-3-2': whole.settings.processes['buoy-3'] });
  });

  test('keeps to its group where values are equal, and is a group of its own where they differ', () => {
    const { doc, read } = open();
    matchParts(doc, new Set(['Q1', 'Q2'].map(id)));
    const clip = clipOf(read(), new Set([id('Q1')]));
    put(doc, clip);
    expect(named(read().parts, 'Q7')).toMatchObject({ values: { match: 'A' } });
    setValues(doc, new Map([[id('Q1'), { width: 3e-6 }]]));
    expect(named(read().parts, 'Q7')).toMatchObject({ values: { width: 3e-6 } });
    put(doc, clip);
    expect(named(read().parts, 'Q8')).toMatchObject({ values: { match: 'B', width: 8e-6 } });
  });

  test('mirrored to its right lies clear of the rest and is the same stage', () => {
    const { doc, read } = open();
    const half = new Set(['Q1', 'Q3'].map(id));
    const before = read();
    const model = before.parts.filter((part) => half.has(part.id));
    const clip = clipOf(before, half);
    const { parts } = put(doc, clip, besideModel(model, before.parts, true));
    const copies = read().parts.filter((part) => parts.has(part.id));
    const copyOf = (ref: string) => copies.filter(isComponent).find((part) => part.ref === ref);
    const [q7, q8] = [copyOf('Q7'), copyOf('Q8')];
    expect([q7?.place.flip, q8?.place.flip]).toEqual([true, false]);
    expect(q7?.place.x).toBeGreaterThan(420);
    expect(q7?.place.y).toBe(340);
    const occupied = new Set(before.parts.map(({ place }) => `${place.x} ${place.y}`));
    for (const { place } of copies) expect(occupied.has(`${place.x} ${place.y}`)).toBe(false);
  });

  test('pasted twice at one point ties itself to nothing', () => {
    const { doc, read } = open(BLANK_DRAWING);
    const clip = clipOf(differentialPair(), new Set([id('R1')]));
    for (let n = 0; n < 3; n++) put(doc, clip, middleAt(clip.parts, read().parts, { x: 0, y: 0 }));
    expect(netlist(read()).nets.nets.size).toBe(6);
  });
});

describe('text on the clipboard', () => {
  const wrong = (text: string) => {
    const read = readClip(text);
    return read.ok ? 'read' : read.reason;
  };
  test('that is something else is refused in words', () => {
    expect(wrong('Dear all')).toMatch(/something other than parts of a sheet.*Copy parts/);
    expect(wrong('[1]')).toMatch(/something other/);
    expect(wrong('')).toMatch(/no text/);
    expect(wrong('x'.repeat(1_000_001))).toMatch(/more than 1 MB/);
    expect(wrong('{"format":"stillpoint.clip","version":1,"parts":[{}],"wires":[],"processes":{}}')).toMatch(/parts.0/);
    const clip = clipOf(differentialPair(), new Set([id('R1')]));
    const loose = {
      ...clip,
      wires: [{ id: 'w', from: { part: 'R1', pin: 'a' }, to: { part: 'R9', pin: 'a' }, bends: [] }],
    };
    expect(wrong(clipText(loose as unknown as Clip))).toMatch(/a wire ends nowhere/);
    expect(
      wrong(JSON.stringify({ format: 'stillpoint.circuit', version: 1, ground: 'gnd', parts: [{ ref: 'R1' }] })),
    ).toMatch(/circuit file on the clipboard cannot be read: R1/);
  });

  test('of a circuit file is laid out, whole or not', () => {
    const part = { ref: 'R1', kind: 'resistor', a: 'out', b: 'gnd', resistance: 100 };
    const read = readClip(JSON.stringify({ format: 'stillpoint.circuit', version: 1, ground: 'gnd', parts: [part] }));
    expect(read.ok && read.clip.parts.map(({ kind }) => kind).sort()).toEqual(['ground', 'net-name', 'resistor']);
    expect(read.ok && read.clip.wires).toHaveLength(2);
  });

  test('with names like __proto__ pollutes nothing', () => {
    const clip = clipText(clipOf(differentialPair(), new Set([id('Q1')]))).replaceAll('buoy-3', '__proto__');
    const read = readClip(clip);
    if (!read.ok) throw new Error(read.reason);
    const { doc } = open(BLANK_DRAWING);
    put(doc, read.clip);
    expect('nfet' in {}).toBe(false);
  });
});

describe('renumbering', () => {
  test('goes column by column or row by row, and one undo step takes it back', () => {
    const { doc, undo, read } = open();
    expect(renumber(doc, 'rows')).toBeGreaterThan(0);
    const order = read()
      .parts.filter(isFet)
      .sort((a, b) => a.place.y - b.place.y || a.place.x - b.place.x)
      .map(({ ref }) => ref);
    expect(order).toEqual(['Q1', 'Q2', 'Q3', 'Q4', 'Q5', 'Q6']);
    undo.undo();
    expect(named(read().parts, 'Q3').id).toBe('Q3');
    renumber(doc, 'columns');
    expect(refsOf(read().parts, new Set(['Q5', 'Q3', 'Q1', 'Q6', 'Q4', 'Q2'].map(id)))).toHaveLength(6);
    expect(named(read().parts, 'Q1').id).toBe('Q5');
    expect(named(read().parts, 'Q2').id).toBe('Q3');
  });

  test('of some parts leaves the others’ numbers to them', () => {
    const { doc, read } = open();
    renumber(doc, 'rows', new Set(['Q1', 'Q3'].map(id)));
    expect(named(read().parts, 'Q1').id).toBe('Q3');
    expect(named(read().parts, 'Q3').id).toBe('Q1');
  });

  test('takes the spread of a supply along', () => {
    const { doc, read } = open({
      ...differentialPair(),
      settings: { ...differentialPair().settings, spread: { supplies: { V1: 0.1 } } },
    });
    setReference(doc, named(read().parts, 'V1'), 'V9');
    expect(read().settings.spread).toEqual({ supplies: { V9: 0.1 } });
    renumber(doc, 'columns');
    expect(read().settings.spread).toEqual({ supplies: { V1: 0.1 } });
  });
});

describe('a matched group', () => {
  const pair = new Set(['Q1', 'Q2'].map(id));
  const pairOf = (drawing: ReturnType<ReturnType<typeof open>['read']>) =>
    ['Q1', 'Q2'].map((ref) => named(drawing.parts, ref));

  test('takes the values of its first part, follows every edit in one step, and stays out of the circuit', () => {
    const { doc, undo, read } = open();
    setValues(doc, new Map([[id('Q2'), { width: 9e-6, intent: null }]]));
    expect(matchParts(doc, pair)).toEqual({ name: 'A', model: 'Q1' });
    expect(membersDiffer(pairOf(read()))).toBe(false);
    undo.stopCapturing();
    setValues(doc, new Map([[id('Q2'), { length: 2e-6, count: 3 }]]));
    expect(named(read().parts, 'Q1')).toMatchObject({ values: { length: 2e-6, count: 3, width: 8e-6 } });
    expect(JSON.stringify(netlist(read()).circuit)).not.toContain('match');
    undo.undo();
    expect(pairOf(read()).map(({ values }) => values)).toMatchObject([{ length: 1e-6 }, { length: 1e-6 }]);
    unmatchParts(doc, new Set([id('Q2')]));
    setValues(doc, new Map([[id('Q1'), { length: 4e-6 }]]));
    expect(named(read().parts, 'Q2')).toMatchObject({ values: { length: 1e-6 } });
  });

  test('left apart by edits made at once is told so, and made equal by choice', () => {
    const { doc, read } = open();
    const colleague = new Y.Doc();
    exchange(doc, colleague);
    matchParts(doc, pair);
    setValues(colleague, new Map([[id('Q2'), { width: 5e-6 }]]));
    exchange(doc, colleague);
    for (const one of [doc, colleague]) expect(membersDiffer(pairOf(readDrawing(one).drawing))).toBe(true);
    equalise(doc, id('Q2'));
    expect(membersDiffer(pairOf(read()))).toBe(false);
    expect(named(read().parts, 'Q1')).toMatchObject({ values: { width: 5e-6 } });
  });

  test('holds parts of one kind', () => {
    const { doc } = open();
    expect(matchParts(doc, new Set(['Q1', 'R1'].map(id)))).toBeUndefined();
  });
});
