import fc from 'fast-check';
import { expect, test } from 'vitest';
import { cutLine, longestStretch, nearestStretch, pushStretch } from '#shared/geometry/bend-wire';
import type { Box } from '#shared/geometry/box';
import { overlap, stretchBoxes } from '#shared/geometry/box';
import { GRID, type GridPoint, samePoint } from '#shared/geometry/place';
import { routeAround } from '#shared/geometry/route-around';
import { type RouteEnd, routeWire } from '#shared/geometry/route-wire';
import { RoutingField } from '#shared/geometry/routing-field';

const SHEET: Box = { left: -400, top: -400, right: 800, bottom: 800 };
const NET = 1;
const OTHER_NET = 2;
const ANY = { x: 0, y: 0 };
const end = (x: number, y: number, leaves: GridPoint = ANY): RouteEnd => ({ at: { x, y }, leaves });
const isOrthogonal = (line: readonly GridPoint[]) =>
  line.slice(1).every((to, i) => to.x === line[i]?.x || to.y === line[i]?.y);

test('a wire whose way is clear has the plain shape', () => {
  const [from, to] = [end(0, 0, { x: 1, y: 0 }), end(200, 100, { x: -1, y: 0 })];
  expect(routeAround(from, to, new RoutingField(SHEET), NET)).toEqual(routeWire(from, to));
});

test('a wire goes around symbols between its ends', () => {
  const field = new RoutingField(SHEET);
  const symbols: Box[] = [
    { left: 80, top: -60, right: 120, bottom: 60 },
    { left: 180, top: -20, right: 220, bottom: 160 },
  ];
  for (const symbol of symbols) field.addInk(symbol);
  const line = routeAround(end(0, 0), end(300, 0), field, NET);
  expect(isOrthogonal(line)).toBe(true);
  expect([line[0], line.at(-1)]).toEqual([
    { x: 0, y: 0 },
    { x: 300, y: 0 },
  ]);
  for (const stretch of stretchBoxes(line, 1))
    for (const symbol of symbols) expect(overlap(stretch, symbol)).toBe(false);
});

test('a wire leaves a place where a tag would stand free where there is room', () => {
  const field = new RoutingField(SHEET);
  const tag: Box = { left: 100, top: -30, right: 220, bottom: 26 };
  field.addWish(tag);
  const line = routeAround(end(0, 0), end(300, 0), field, NET);
  for (const stretch of stretchBoxes(line, 1)) expect(overlap(stretch, tag)).toBe(false);
});

test('a wire crosses another net but never runs along it or over its terminals', () => {
  const field = new RoutingField(SHEET);
  field.addWire(
    [
      { x: 50, y: 0 },
      { x: 250, y: 0 },
    ],
    OTHER_NET,
  );
  field.addTerminal({ x: 50, y: 0 }, OTHER_NET);
  field.addTerminal({ x: 250, y: 0 }, OTHER_NET);
  const line = routeAround(end(0, 0), end(300, 0), field, NET);
  const along = line.slice(1).some((to, i) => {
    const from = line[i] as GridPoint;
    return from.y === 0 && to.y === 0 && Math.max(from.x, to.x) > 50 && Math.min(from.x, to.x) < 250;
  });
  expect(along).toBe(false);
});

test('a wire shut in on all sides still arrives', () => {
  const field = new RoutingField(SHEET);
  field.addInk({ left: 200, top: -100, right: 400, bottom: 100 });
  const line = routeAround(end(0, 0), end(300, 0), field, NET);
  expect(isOrthogonal(line)).toBe(true);
  expect(line.at(-1)).toEqual({ x: 300, y: 0 });
});

const onGrid = fc.integer({ min: -20, max: 20 }).map((steps) => steps * GRID);
const point = fc.record({ x: onGrid, y: onGrid });

test('a line cut at any of its points is drawn again from its two halves', () => {
  fc.assert(
    fc.property(point, point, fc.array(point, { maxLength: 4 }), fc.nat(), (a, b, corners, which) => {
      const line = routeWire(end(a.x, a.y), end(b.x, b.y), corners);
      const i = which % Math.max(1, line.length - 1);
      const [from, to] = [line[i] as GridPoint, line[i + 1] as GridPoint];
      const at = { x: Math.round((from.x + to.x) / 20) * 10, y: Math.round((from.y + to.y) / 20) * 10 };
      const [before, after] = cutLine(line, at);
      const first = routeWire(end(a.x, a.y), end(at.x, at.y), before);
      const second = routeWire(end(at.x, at.y), end(b.x, b.y), after);
      const covered = [...stretchBoxes(first, 1), ...stretchBoxes(second, 1)];
      for (const corner of line) {
        const about = { left: corner.x, top: corner.y, right: corner.x + 0.1, bottom: corner.y + 0.1 };
        expect(covered.some((box) => overlap(box, about))).toBe(true);
      }
    }),
  );
});

test('pushing a stretch moves it alone, and leaves a symbol by its lead', () => {
  const corner: GridPoint[] = [
    { x: 0, y: 0 },
    { x: 0, y: 100 },
    { x: 200, y: 100 },
  ];
  const tied = { from: false, to: false };
  const level = longestStretch(corner, false);
  const upright = nearestStretch(corner, { x: 4, y: 50 });
  if (!level || !upright) throw new Error('both stretches are there');
  expect(pushStretch(corner, level, 40, tied)).toEqual([
    { x: 0, y: 140 },
    { x: 190, y: 140 },
    { x: 190, y: 100 },
  ]);
  expect(pushStretch(corner, upright, 30, tied)).toEqual([
    { x: 0, y: 10 },
    { x: 30, y: 10 },
    { x: 30, y: 100 },
  ]);
  expect(pushStretch(corner, upright, 30, { from: true, to: true })).toEqual([
    { x: 30, y: 0 },
    { x: 30, y: 100 },
  ]);
});

test('a pushed wire stays orthogonal and keeps its ends', () => {
  fc.assert(
    fc.property(point, point, fc.nat(), fc.integer({ min: -9, max: 9 }), (a, b, which, steps) => {
      fc.pre(!samePoint(a, b));
      const line = routeWire(end(a.x, a.y), end(b.x, b.y));
      const stretch = nearestStretch(line, line[which % line.length] as GridPoint);
      if (!stretch) throw new Error('a line has a stretch');
      const bends = pushStretch(line, stretch, steps * GRID, { from: false, to: false });
      expect(isOrthogonal([a, ...bends, b])).toBe(true);
    }),
  );
});
