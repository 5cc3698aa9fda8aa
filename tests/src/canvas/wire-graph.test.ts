import { expect, test } from 'vitest';
import type { Drawing } from '#shared/circuit/drawing';
import { findNets } from '#shared/circuit/nets';
import { STARTERS } from '#shared/starters/starters';
import { layOut, NOTHING_IN_HAND } from '../../../src/features/canvas/sheet-geometry';
import { placeTexts } from '../../../src/features/canvas/sheet-texts';
import { wireGraph } from '../../../src/features/canvas/wire-graph';
import { drawingWith, drawn, wired } from '../../support/draw';

const R = { values: { resistance: 1e3 } };

function graphOf(drawing: Drawing) {
  const nets = findNets(drawing);
  const geometry = layOut(drawing, nets, NOTHING_IN_HAND, undefined);
  return { nets, geometry, graph: wireGraph(drawing, geometry, nets) };
}

test('three ends that meet make a dot, two do not', () => {
  const two = [drawn('a', 'resistor', 0, 0, { ...R, ref: 'R1' }), drawn('b', 'resistor', 0, 60, { ...R, ref: 'R2' })];
  expect(graphOf(drawingWith(two)).graph.dots).toEqual([]);
  const three = [...two, drawn('c', 'resistor', 100, 100, { ...R, ref: 'R3' })];
  expect(graphOf(drawingWith(three, [wired('w', 'c.a', 'a.b')])).graph.dots).toEqual([{ x: 0, y: 30 }]);
});

test('wires that leave one terminal together make the dot where they part', () => {
  const parts = [
    drawn('a', 'resistor', 0, 0, { ...R, ref: 'R1' }),
    drawn('b', 'resistor', 0, 200, { ...R, ref: 'R2' }),
    drawn('j', 'junction', 100, 100),
  ];
  const wires = [wired('w1', 'a.b', 'b.a'), { ...wired('w2', 'a.b', 'j.net'), bends: [{ x: 0, y: 100 }] }];
  const { graph } = graphOf(drawingWith(parts, wires));
  expect(graph.dots).toContainEqual({ x: 0, y: 100 });
  expect(graph.dots).not.toContainEqual({ x: 0, y: 30 });
});

test('wires of two nets that cross make no dot, and neither net is named across the other', () => {
  const parts = [
    drawn('l', 'net-name', -100, 0, { values: { net: 'across' } }),
    drawn('r', 'net-name', 100, 0, { values: { net: 'across' }, place: { x: 100, y: 0, turn: 0, flip: true } }),
    drawn('t', 'resistor', 0, -130, { ...R, ref: 'R1' }),
    drawn('b', 'resistor', 0, 130, { ...R, ref: 'R2' }),
  ];
  const { graph } = graphOf(drawingWith(parts, [wired('w1', 'l.net', 'r.net'), wired('w2', 't.b', 'b.a')]));
  expect(graph.dots).toEqual([]);
  for (const run of [...graph.runsOf.values()].flat()) {
    const inside = run.upright ? run.from.y < 0 && run.to.y > 0 : run.from.x < 0 && run.to.x > 0;
    expect(inside).toBe(false);
  }
});

test.each(STARTERS)('$id: every name set on a wire is written into a stretch of its own net', ({ drawing }) => {
  const { nets, geometry, graph } = graphOf(drawing);
  const { spots } = placeTexts(drawing, geometry, graph, nets);
  expect(spots.map(({ net }) => net)).not.toContain(drawing.settings.ground);
  for (const { net, at } of spots) {
    const on = (graph.runsOf.get(net) ?? []).some(
      ({ from, to }) => from.x <= at.x && at.x <= to.x && from.y <= at.y && at.y <= to.y,
    );
    expect(on, `${net} at ${at.x}, ${at.y}`).toBe(true);
  }
});

test('a part under the hand takes its wires along, and what lies still stays the same object', () => {
  const drawing = STARTERS[2]?.drawing ?? drawingWith([]);
  const nets = findNets(drawing);
  const before = layOut(drawing, nets, NOTHING_IN_HAND, undefined);
  const moved = drawing.parts.find((part) => 'ref' in part && part.ref === 'R2');
  if (!moved) throw new Error('the starter has no R2');
  const to = { ...moved.place, x: moved.place.x + 50 };
  const after = layOut(drawing, nets, { ...NOTHING_IN_HAND, elsewhere: new Map([[moved.id, to]]) }, before);
  const changed = drawing.wires.filter(({ id }) => before.routes.get(id) !== after.routes.get(id));
  expect(changed.length).toBeGreaterThan(0);
  for (const { from, to: end } of changed) expect([from.part, end.part]).toContain(moved.id);
  expect(after.parts.get(moved.id)?.place).toEqual(to);
});

test('a name written into a wire is in no wire’s way', () => {
  const parts = [
    drawn('a', 'resistor', 0, 0, { ...R, ref: 'R1' }),
    drawn('b', 'resistor', 0, 200, { ...R, ref: 'R2' }),
    drawn('n', 'net-name', 0, 100, { values: { net: 'mid' }, place: { x: 0, y: 100, turn: 3, flip: false } }),
  ];
  const { geometry } = graphOf(drawingWith(parts, [wired('w1', 'a.b', 'n.net'), wired('w2', 'n.net', 'b.a')]));
  for (const line of geometry.routes.values()) expect(line).toHaveLength(2);
});
