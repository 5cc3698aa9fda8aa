import { describe, expect, test } from 'vitest';
import * as Y from 'yjs';
import { type DrawnPart, isComponent } from '#shared/circuit/drawing';
import { addPart, connect, connectToWire, placeParts, remove, setReference, setValues } from '#shared/doc/commands';
import { readDrawing } from '#shared/doc/read-drawing';
import { OWN_EDIT, sheetMaps } from '#shared/doc/sheet-maps';
import { writeDrawing } from '#shared/doc/write-drawing';
import { STARTERS } from '#shared/starters/starters';

let ids = 0;
const newId = () => `id-${++ids}`;
const at = (x: number, y: number) => ({ x, y, turn: 0, flip: false }) as const;
const partsOf = (doc: Y.Doc) => readDrawing(doc).drawing.parts;
const part = (doc: Y.Doc, id: string): DrawnPart => {
  const found = partsOf(doc).find((candidate) => candidate.id === id);
  if (!found) throw new Error(`no part ${id}`);
  return found;
};
const setValue = (doc: Y.Doc, { id }: DrawnPart, name: string, value: unknown) =>
  setValues(doc, new Map([[id, { [name]: value }]]));
const undoFor = (doc: Y.Doc) =>
  new Y.UndoManager(Object.values(sheetMaps(doc)), { trackedOrigins: new Set([OWN_EDIT]), captureTimeout: 0 });
function exchange(a: Y.Doc, b: Y.Doc): void {
  Y.applyUpdate(b, Y.encodeStateAsUpdate(a, Y.encodeStateVector(b)));
  Y.applyUpdate(a, Y.encodeStateAsUpdate(b, Y.encodeStateVector(a)));
}

test('every starter written to a document is read back as it was', () => {
  for (const { drawing } of STARTERS) {
    const doc = new Y.Doc();
    writeDrawing(doc, drawing);
    const read = readDrawing(doc);
    const sorted = <T extends { id: string }>(items: readonly T[]) => [...items].sort((a, b) => (a.id < b.id ? -1 : 1));
    expect(read.setAside).toEqual([]);
    expect(read.drawing).toEqual({ ...drawing, parts: sorted(drawing.parts), wires: sorted(drawing.wires) });
  }
});

test('parts take the next free reference and a given one is refused', () => {
  const doc = new Y.Doc();
  const first = addPart(doc, 'nfet', at(0, 0), newId);
  const second = addPart(doc, 'pfet', at(200, 0), newId);
  expect(partsOf(doc).map((p) => isComponent(p) && p.ref)).toEqual(['Q1', 'Q2']);
  expect(setReference(doc, part(doc, second), 'Q1')).toMatchObject({ ok: false });
  expect(setReference(doc, part(doc, first), 'Q7')).toEqual({ ok: true });
  expect(part(doc, first)).toMatchObject({ ref: 'Q7' });
});

test('a move and an edit made at once both survive', () => {
  const one = new Y.Doc();
  const id = addPart(one, 'resistor', at(0, 0), newId);
  const two = new Y.Doc();
  exchange(one, two);
  placeParts(one, new Map([[id, at(100, 100)]]));
  setValue(two, part(two, id), 'resistance', 4700);
  exchange(one, two);
  for (const doc of [one, two])
    expect(part(doc, id)).toMatchObject({ place: { x: 100, y: 100 }, values: { resistance: 4700 } });
});

test('undo takes back only what this person did, and brings a deleted part back with a colleague’s edit', () => {
  const one = new Y.Doc();
  const two = new Y.Doc();
  const undo = undoFor(one);
  const id = addPart(one, 'resistor', at(0, 0), newId);
  exchange(one, two);
  setValue(two, part(two, id), 'resistance', 330);
  undo.stopCapturing();
  remove(one, new Set([id]), new Set());
  exchange(one, two);
  expect(partsOf(two)).toEqual([]);
  undo.undo();
  exchange(one, two);
  expect(part(two, id)).toMatchObject({ values: { resistance: 330 } });
  expect(part(one, id)).toMatchObject({ values: { resistance: 330 } });
});

test('deleting a part takes its wires in the same undo step', () => {
  const doc = new Y.Doc();
  const undo = undoFor(doc);
  const a = addPart(doc, 'resistor', at(0, 0), newId);
  const b = addPart(doc, 'resistor', at(200, 0), newId);
  connect(doc, { part: a, pin: 'b' }, { part: b, pin: 'b' }, newId);
  undo.stopCapturing();
  remove(doc, new Set([a]), new Set());
  expect(readDrawing(doc).drawing).toMatchObject({ parts: [{ id: b }], wires: [] });
  undo.undo();
  expect(readDrawing(doc).drawing.wires).toHaveLength(1);
});

test('an end tied to a wire makes a junction and one net', () => {
  const doc = new Y.Doc();
  const [a, b, c] = [at(0, 0), at(200, 0), at(100, 200)].map((place) => addPart(doc, 'resistor', place, newId));
  if (!a || !b || !c) throw new Error('three parts were placed');
  connect(doc, { part: a, pin: 'b' }, { part: b, pin: 'b' }, newId);
  const [wire] = readDrawing(doc).drawing.wires;
  if (!wire) throw new Error('a wire was drawn');
  const junction = connectToWire(doc, { part: c, pin: 'a' }, wire, { x: 100, y: 30 }, newId);
  const { wires } = readDrawing(doc).drawing;
  expect(wires).toHaveLength(3);
  expect(wires.every((w) => w.to.part === junction)).toBe(true);
});

describe('rubbish in a document', () => {
  test('is set aside and listed, the rest works', () => {
    const doc = new Y.Doc();
    const good = addPart(doc, 'resistor', at(0, 0), newId);
    const { parts, params, wires, sheet, places } = sheetMaps(doc);
    parts.set('bad', { kind: 'resistor', ref: 'R9', place: at(0, 5), values: { resistance: -1 } });
    parts.set('__proto__', 'x');
    parts.set('text', 'x');
    params.set(`${good}/resistance`, 'lots');
    params.set(`${good}/__proto__`, { polluted: true });
    places.set(good, { x: 'a' });
    wires.set('w', { from: 3 });
    wires.set('loose', { from: { part: good, pin: 'a' }, to: { part: 'gone', pin: 'a' } });
    sheet.set('temperature', -300);
    sheet.set('process/__proto__', { nfet: 1 });
    const { drawing, setAside } = readDrawing(doc);
    expect(drawing.parts).toMatchObject([{ id: good, values: { resistance: 10e3 }, place: { x: 0, y: 0 } }]);
    expect(drawing.wires).toEqual([]);
    expect(drawing.settings.temperature).toBe(27);
    expect(setAside.map(({ map, key }) => `${map} ${key}`)).toEqual(
      expect.arrayContaining([
        'parts bad',
        'parts __proto__',
        'parts text',
        `params ${good}/resistance`,
        'wires w',
        'sheet temperature',
        'sheet process/__proto__',
      ]),
    );
    expect('polluted' in {}).toBe(false);
  });

  test('a reference given twice is settled alike by every reader', () => {
    const one = new Y.Doc();
    const two = new Y.Doc();
    const a = addPart(one, 'resistor', at(0, 0), () => 'aaa');
    const b = addPart(two, 'resistor', at(200, 0), () => 'bbb');
    exchange(one, two);
    for (const doc of [one, two]) {
      expect(part(doc, a)).toMatchObject({ ref: 'R1' });
      expect(part(doc, b)).toMatchObject({ ref: 'R2' });
    }
  });
});
