import { expect, test } from 'vitest';
import type { Drawing } from '#shared/circuit/drawing';
import { findNets } from '#shared/circuit/nets';
import { STARTERS } from '#shared/starters/starters';
import { branches } from '../../../src/features/canvas/branches';
import { currentSpots } from '../../../src/features/canvas/current-spots';
import { layOut, NOTHING_IN_HAND } from '../../../src/features/canvas/sheet-geometry';
import { placeTexts } from '../../../src/features/canvas/sheet-texts';
import { wireGraph } from '../../../src/features/canvas/wire-graph';
import { drawingWith, drawn, wired } from '../../support/draw';

const R = { values: { resistance: 1e3 } };

function pictureOf(drawing: Drawing) {
  const nets = findNets(drawing);
  const geometry = layOut(drawing, nets, NOTHING_IN_HAND, undefined);
  return { nets, geometry, graph: wireGraph(drawing, geometry, nets) };
}

function branchesOf(drawing: Drawing): string[] {
  const { nets, geometry, graph } = pictureOf(drawing);
  return branches(drawing, geometry, graph, nets).map(({ part, pin, line }) => {
    const end = line[line.length - 1];
    return `${part.ref}.${pin} to ${end?.x}, ${end?.y}`;
  });
}

const [R1, R2, R3] = [
  drawn('a', 'resistor', 0, 0, { ...R, ref: 'R1' }),
  drawn('b', 'resistor', 0, 200, { ...R, ref: 'R2' }),
  drawn('c', 'resistor', 200, 200, { ...R, ref: 'R3' }),
];

test('a wire from terminal to terminal is one branch, told once', () => {
  expect(branchesOf(drawingWith([R1, R2], [wired('w', 'a.b', 'b.a')]))).toEqual(['R1.b to 0, 170']);
});

test('a branch ends where wires part', () => {
  const junction = drawn('j', 'junction', 0, 100);
  const wires = [wired('w1', 'a.b', 'j.net'), wired('w2', 'j.net', 'b.a'), wired('w3', 'j.net', 'c.a')];
  expect(branchesOf(drawingWith([R1, R2, R3, junction], wires))).toEqual([
    'R1.b to 0, 100',
    'R2.a to 0, 100',
    'R3.a to 0, 100',
  ]);
});

test('a branch ends at a name that stands elsewhere too, and goes on past one that does not', () => {
  const wire = wired('w', 'a.b', 'b.a');
  const name = (id: string, x: number, y: number) => drawn(id, 'net-name', x, y, { values: { net: 'mid' } });
  const through = [wired('w1', 'a.b', 'n.net'), wired('w2', 'n.net', 'b.a')];
  expect(branchesOf(drawingWith([R1, R2, name('n', 0, 100)], through))).toEqual(['R1.b to 0, 170']);
  expect(branchesOf(drawingWith([R1, R2, name('n', 0, 100), name('m', 300, 300)], through))).toEqual([
    'R1.b to 0, 100',
    'R2.a to 0, 100',
  ]);
  expect(branchesOf(drawingWith([R1, R2], [wire]))).toHaveLength(1);
});

test('terminals that touch have no wire between them to tell of', () => {
  const touching = drawn('d', 'resistor', 0, 60, { ...R, ref: 'R4' });
  expect(branchesOf(drawingWith([R1, touching, R2], [wired('w', 'a.b', 'b.a')]))).toEqual(['R2.a to 0, 30']);
});

test.each(STARTERS)('$id: gates have no current, and the supply shows what it delivers', ({ drawing }) => {
  const { nets, geometry, graph } = pictureOf(drawing);
  const spots = currentSpots(drawing, geometry, graph, nets, placeTexts(drawing, geometry, graph, nets));
  const told = spots.map(({ part, pin }) => `${part.ref}.${pin}`);
  expect(told.filter((name) => /gate|body/.test(name))).toEqual([]);
  expect(told.some((name) => name.startsWith('V1.'))).toBe(true);
});
