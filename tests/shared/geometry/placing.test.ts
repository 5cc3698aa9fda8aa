import fc from 'fast-check';
import { expect, test } from 'vitest';
import { pinPlaces, SYMBOL_PINS, type SymbolKind } from '#shared/geometry/pins';
import { GRID, mirrored, onSheet, type Place, samePoint, turned } from '#shared/geometry/place';
import { routeWire } from '#shared/geometry/route-wire';

const onGrid = fc.integer({ min: -50, max: 50 }).map((steps) => steps * GRID);
const place = fc.record({
  x: onGrid,
  y: onGrid,
  turn: fc.constantFrom(0, 1, 2, 3),
  flip: fc.boolean(),
}) as fc.Arbitrary<Place>;
const kind = fc.constantFrom(...(Object.keys(SYMBOL_PINS) as SymbolKind[]));

test('terminals lie on the grid whatever the turn', () => {
  fc.assert(
    fc.property(kind, place, (symbol, where) => {
      for (const { at } of pinPlaces(symbol, where, true)) {
        expect(Math.abs(at.x % GRID)).toBe(0);
        expect(Math.abs(at.y % GRID)).toBe(0);
      }
    }),
  );
});

test('four turns and two mirrorings bring a symbol back', () => {
  fc.assert(
    fc.property(place, (where) => {
      expect([1, 1, 1, 1].reduce((at) => turned(at, 1), where)).toEqual(where);
      expect(mirrored(mirrored(where))).toEqual(where);
    }),
  );
});

test('mirroring exchanges left and right as seen on the sheet, also of a turned symbol', () => {
  fc.assert(
    fc.property(kind, place, (symbol, where) => {
      const before = pinPlaces(symbol, where, true);
      const after = pinPlaces(symbol, mirrored(where), true);
      before.forEach(({ at }, index) => {
        expect(after[index]?.at).toEqual({ x: 2 * where.x - at.x + 0, y: at.y });
      });
    }),
  );
});

test('a clockwise turn brings what was above to the right', () => {
  expect(onSheet({ x: 0, y: -30 }, { x: 100, y: 100, turn: 1, flip: false })).toEqual({ x: 130, y: 100 });
});

test('wires are orthogonal, begin and end at their terminals, and visit chosen corners in order', () => {
  const end = fc.record({
    at: fc.record({ x: onGrid, y: onGrid }),
    leaves: fc.constantFrom({ x: 0, y: -1 }, { x: 0, y: 1 }, { x: -1, y: 0 }, { x: 1, y: 0 }, { x: 0, y: 0 }),
  });
  const bends = fc.array(fc.record({ x: onGrid, y: onGrid }), { maxLength: 3 });
  fc.assert(
    fc.property(end, end, bends, (from, to, corners) => {
      const line = routeWire(from, to, corners);
      expect(line[0]).toEqual(from.at);
      expect(line.at(-1)).toEqual(to.at);
      for (const [index, point] of line.entries()) {
        const next = line[index + 1];
        if (next) expect(point.x === next.x || point.y === next.y).toBe(true);
        if (next && line.length > 2) expect(samePoint(point, next)).toBe(false);
      }
    }),
  );
});

test('a wire never runs back through the symbol it leaves', () => {
  // From an upper end that leaves upwards to a lower one that leaves downwards: around, not straight through both.
  const line = routeWire(
    { at: { x: 0, y: 0 }, leaves: { x: 0, y: -1 } },
    { at: { x: 0, y: 100 }, leaves: { x: 0, y: 1 } },
  );
  expect(line).toEqual([
    { x: 0, y: 0 },
    { x: -20, y: 0 },
    { x: -20, y: 100 },
    { x: 0, y: 100 },
  ]);
});
