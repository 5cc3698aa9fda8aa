import { expect, test } from 'vitest';
import * as Y from 'yjs';
import { addPart, connect, connectToWire, setBends } from '#shared/doc/commands';
import { readDrawing } from '#shared/doc/read-drawing';
import { OWN_EDIT, sheetMaps } from '#shared/doc/sheet-maps';

let ids = 0;
const newId = () => `id-${++ids}`;
const at = (x: number, y: number) => ({ x, y, turn: 0, flip: false }) as const;

function wiredSheet() {
  const doc = new Y.Doc();
  const [a, b, c] = [at(0, 0), at(200, 0), at(100, 200)].map((place) => addPart(doc, 'resistor', place, newId));
  if (!a || !b || !c) throw new Error('three parts were placed');
  connect(doc, { part: a, pin: 'b' }, { part: b, pin: 'b' }, newId);
  const undo = new Y.UndoManager(Object.values(sheetMaps(doc)), {
    trackedOrigins: new Set([OWN_EDIT]),
    captureTimeout: 0,
  });
  const wires = () => readDrawing(doc).drawing.wires;
  const [wire] = wires();
  if (!wire) throw new Error('a wire was drawn');
  return { doc, a, b, c, wire, wires, undo };
}

const BELOW = [
  { x: 0, y: 90 },
  { x: 200, y: 90 },
];

test('corners chosen for a wire are one undo step, and none gives it back its own way', () => {
  const { doc, wire, wires, undo } = wiredSheet();
  setBends(doc, wire.id, BELOW);
  expect(wires()[0]?.bends).toEqual(BELOW);
  undo.undo();
  expect(wires()[0]?.bends).toEqual([]);
  undo.redo();
  setBends(doc, wire.id, []);
  expect(wires()[0]?.bends).toEqual([]);
});

test('the same corners again write nothing, nor do corners for a wire that is gone', () => {
  const { doc, wire } = wiredSheet();
  setBends(doc, wire.id, BELOW);
  const before = Y.encodeStateVector(doc);
  setBends(doc, wire.id, BELOW);
  setBends(doc, newId() as typeof wire.id, BELOW);
  expect(Y.encodeStateVector(doc)).toEqual(before);
});

test('a wire tied in its middle keeps its shape: each half has the corners on its side', () => {
  const { doc, a, b, c, wire, wires } = wiredSheet();
  const junction = connectToWire(doc, { part: c, pin: 'a' }, { ...wire, bends: BELOW }, { x: 100, y: 90 }, newId);
  const half = (part: string) => wires().find(({ from }) => from.part === part);
  expect(half(a)).toMatchObject({ to: { part: junction }, bends: [{ x: 0, y: 90 }] });
  expect(half(b)).toMatchObject({ to: { part: junction }, bends: [{ x: 200, y: 90 }] });
  expect(half(c)).toMatchObject({ to: { part: junction }, bends: [] });
});

test('a wire tied at one of its corners keeps the others only', () => {
  const { doc, a, b, c, wire, wires } = wiredSheet();
  connectToWire(doc, { part: c, pin: 'a' }, { ...wire, bends: BELOW }, { x: 200, y: 90 }, newId);
  const half = (part: string) => wires().find(({ from }) => from.part === part);
  expect(half(a)?.bends).toEqual([{ x: 0, y: 90 }]);
  expect(half(b)?.bends).toEqual([]);
});
