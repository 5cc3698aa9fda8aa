import { expect, test } from 'vitest';
import { aligned, spaced } from '#shared/geometry/arrange';
import { mirroredAbout } from '#shared/geometry/carry';
import { pinPlaces } from '#shared/geometry/pins';
import type { Place } from '#shared/geometry/place';

const stand = (id: string, x: number, y: number, at = { x, y }) => ({
  id,
  place: { x, y, turn: 0, flip: false } as Place,
  at,
});

test('parts are aligned by the chosen point, on the grid, and only along one axis', () => {
  const parts = [stand('a', 0, 0), stand('b', 50, 100), stand('c', 30, 200)];
  const xs = (places: Map<string, Place>) => [...places.values()].map(({ x }) => x);
  expect(xs(aligned(parts, 'left'))).toEqual([0, 0, 0]);
  expect(xs(aligned(parts, 'right'))).toEqual([50, 50, 50]);
  expect(xs(aligned(parts, 'centre'))).toEqual([30, 30, 30]);
  expect([...aligned(parts, 'top').values()].map(({ x, y }) => [x, y])).toEqual([
    [0, 0],
    [50, 0],
    [30, 0],
  ]);
  const byTerminal = [stand('a', 0, 0, { x: -40, y: 0 }), stand('b', 100, 20, { x: 140, y: 20 })];
  expect(aligned(byTerminal, 'left').get('b')).toMatchObject({ x: -80, y: 20 });
});

test('the outermost stay and the rest stand equally far apart, on the grid', () => {
  const parts = [stand('a', 0, 0), stand('c', 200, 0), stand('b', 20, 0), stand('d', 210, 0)];
  const places = spaced(parts, 'across');
  expect(['a', 'b', 'c', 'd'].map((id) => places.get(id)?.x)).toEqual([0, 70, 140, 210]);
});

test('a mirror image’s terminals are the mirror images of the terminals, whatever the turn', () => {
  const { place, point } = mirroredAbout(330);
  for (const turn of [0, 1, 2, 3] as const) {
    for (const flip of [false, true]) {
      const own: Place = { x: 40, y: 70, turn, flip };
      const wanted = pinPlaces('nfet', own, true).map(({ at }) => point(at));
      expect(pinPlaces('nfet', place(own), true).map(({ at }) => at)).toEqual(wanted);
    }
  }
});
