import { expect, test } from 'vitest';
import type { Drawing } from '#shared/circuit/drawing';
import { findNets, terminalKey } from '#shared/circuit/nets';
import { type Box, hungBox, overlap, stretchBoxes } from '#shared/geometry/box';
import { mirrored, turned } from '#shared/geometry/place';
import { STARTERS } from '#shared/starters/starters';
import { currentSpots, figureBox } from '../../../src/features/canvas/current-spots';
import { spotBox } from '../../../src/features/canvas/net-spots';
import { layOut, NOTHING_IN_HAND } from '../../../src/features/canvas/sheet-geometry';
import { onPart, placeTexts } from '../../../src/features/canvas/sheet-texts';
import { inkOf, labelBlock, TAG_HEIGHT, TAG_WIDTH } from '../../../src/features/canvas/text-blocks';
import { wireGraph } from '../../../src/features/canvas/wire-graph';
import { drawingWith, drawn, wired } from '../../support/draw';

type Thing = { readonly name: string; readonly box: Box };

/** What of a drawing lies over what, by name; nothing where every text has found its place. */
function overlaps(drawing: Drawing): string[] {
  const nets = findNets(drawing);
  const geometry = layOut(drawing, nets, NOTHING_IN_HAND, undefined);
  const graph = wireGraph(drawing, geometry, nets);
  const placed = placeTexts(drawing, geometry, graph, nets);
  const { labels, tags, spots, written } = placed;
  const texts: Thing[] = [];
  const ink: Thing[] = [];
  for (const part of geometry.parts.values()) {
    const name = 'ref' in part ? part.ref : `${part.kind} ${part.id}`;
    const tag = tags.get(part.id);
    const label = labels.get(part.id);
    const block = labelBlock(part);
    if (tag) texts.push({ name: `tag of ${name}`, box: hungBox(onPart(tag, part), TAG_WIDTH, TAG_HEIGHT) });
    if (label && block) {
      texts.push({ name: `label of ${name}`, box: hungBox(onPart(label, part), block.width, block.height) });
    }
    if (!written.has(part.id)) ink.push(...inkOf(part).map((box) => ({ name: `symbol of ${name}`, box })));
  }
  for (const spot of currentSpots(drawing, geometry, graph, nets, placed)) {
    texts.push({ name: `current of ${spot.part.ref}.${spot.pin}`, box: figureBox(spot) });
  }
  const wires = drawing.wires.flatMap((wire) =>
    stretchBoxes(geometry.routes.get(wire.id) ?? [], 1).map((box) => ({
      name: `wire of ${nets.netOf.get(terminalKey(wire.from))}`,
      box,
    })),
  );
  const dots = graph.dots.map(({ x, y }) => ({
    name: `dot at ${x}, ${y}`,
    box: { left: x - 3, top: y - 3, right: x + 3, bottom: y + 3 },
  }));
  const names = spots.map((spot) => ({ name: `name of ${spot.net}`, box: spotBox(spot) }));
  const found: string[] = [];
  const compare = (some: readonly Thing[], others: readonly Thing[]) => {
    for (const [i, a] of some.entries()) {
      for (const b of some === others ? others.slice(i + 1) : others) {
        if (overlap(a.box, b.box)) found.push(`${a.name} over ${b.name}`);
      }
    }
  };
  compare(texts, texts);
  compare(texts, [...ink, ...wires, ...dots, ...names]);
  compare(names, [...ink, ...dots]);
  compare(names, names);
  for (const name of names) {
    const own = `wire of ${name.name.replace('name of ', '')}`;
    const across = wires.filter((wire) => overlap(name.box, wire.box));
    if (across.some((wire) => wire.name !== own)) found.push(`${name.name} over another wire`);
    if (across.length > 1) found.push(`${name.name} over ${across.length} stretches of wire`);
  }
  return found;
}

test.each(STARTERS)('$id: no text lies over a symbol, a wire, a dot or another text', ({ drawing }) => {
  expect(overlaps(drawing)).toEqual([]);
});

test.each(STARTERS)(
  '$id: every FET has a tag, every part with a value a label, every named net its name',
  ({ drawing }) => {
    const nets = findNets(drawing);
    const geometry = layOut(drawing, nets, NOTHING_IN_HAND, undefined);
    const graph = wireGraph(drawing, geometry, nets);
    const texts = placeTexts(drawing, geometry, graph, nets);
    for (const part of drawing.parts) {
      if (part.kind === 'nfet' || part.kind === 'pfet') expect(texts.tags.has(part.id)).toBe(true);
      if (labelBlock(part) && part.kind !== 'net-name') expect(texts.labels.has(part.id)).toBe(true);
      if (part.kind === 'net-name') expect(texts.labels.has(part.id)).toBe(!texts.written.has(part.id));
    }
  },
);

test('FETs close together, turned and mirrored, still keep their texts apart', () => {
  const fet = (id: string, x: number, y: number, quarters: number, flip: boolean) => {
    const upright = { x, y, turn: 0, flip: false } as const;
    const place = turned(flip ? mirrored(upright) : upright, quarters);
    return drawn(id, 'nfet', x, y, { ref: id, place, values: { width: 1e-5, length: 1e-6 } });
  };
  const parts = [
    fet('Q1', 0, 0, 0, false),
    fet('Q2', 160, 0, 0, true),
    fet('Q3', 0, 130, 1, false),
    fet('Q4', 160, 130, 3, true),
  ];
  expect(
    overlaps(drawingWith(parts, [wired('w1', 'Q1.drain', 'Q2.drain'), wired('w2', 'Q1.source', 'Q4.drain')])),
  ).toEqual([]);
});

test('the outcome depends on the drawing alone, not on the order of its records', () => {
  const place = (drawing: Drawing) => {
    const nets = findNets(drawing);
    const geometry = layOut(drawing, nets, NOTHING_IN_HAND, undefined);
    const { tags, labels } = placeTexts(drawing, geometry, wireGraph(drawing, geometry, nets), nets);
    return [...tags, ...labels].map(([id, { at }]) => `${id} ${at.x} ${at.y}`).sort();
  };
  for (const { drawing } of STARTERS) {
    const shuffled = { ...drawing, parts: [...drawing.parts].reverse(), wires: [...drawing.wires].reverse() };
    expect(place(shuffled)).toEqual(place(drawing));
  }
});
