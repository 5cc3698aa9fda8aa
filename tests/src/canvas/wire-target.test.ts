import { expect, test } from 'vitest';
import type { WireEnd } from '#shared/circuit/drawing';
import { findNets } from '#shared/circuit/nets';
import { layOut, NOTHING_IN_HAND } from '../../../src/features/canvas/sheet-geometry';
import { targetAt } from '../../../src/features/canvas/wire-target';
import { drawingWith, drawn, wired } from '../../support/draw';

const R = { values: { resistance: 1e3 } };
const [a, b, c] = [
  drawn('a', 'resistor', 0, 0, { ...R, ref: 'R1' }),
  drawn('b', 'resistor', 0, 200, { ...R, ref: 'R2' }),
  drawn('c', 'resistor', 200, 100, { ...R, ref: 'R3' }),
];
const wire = wired('w', 'a.b', 'b.a');
const drawing = drawingWith([a, b, c], [wire]);
const nets = findNets(drawing);
const geometry = layOut(drawing, nets, NOTHING_IN_HAND, undefined);
const from: WireEnd = { part: c.id, pin: 'a' };

test('the free end takes the terminal it is near, before the wire that ends there', () => {
  expect(targetAt({ x: 4, y: 35 }, from, drawing, geometry)).toEqual({ kind: 'terminal', end: wire.from });
});

test('beside a wire it takes the grid point on it', () => {
  expect(targetAt({ x: 6, y: 103 }, from, drawing, geometry)).toEqual({ kind: 'wire', wire, at: { x: 0, y: 100 } });
});

test('away from both it takes nothing, nor does it take where it began', () => {
  expect(targetAt({ x: 60, y: 103 }, from, drawing, geometry)).toBeUndefined();
  expect(targetAt({ x: 200, y: 70 }, from, drawing, geometry)).toBeUndefined();
});
