import { type GridPoint, mirrored, type Place } from './place';

/** How a copy lies to what it was copied from. */
export type Carry = {
  readonly point: (point: GridPoint) => GridPoint;
  readonly place: (place: Place) => Place;
};

export function shiftedBy({ x, y }: GridPoint): Carry {
  return {
    point: (point) => ({ x: point.x + x, y: point.y + y }),
    place: (place) => ({ ...place, x: place.x + x, y: place.y + y }),
  };
}

/** The mirror image about a vertical axis; `twice` is twice the axis's x, so that it may lie between two lines of the grid. */
export function mirroredAbout(twice: number): Carry {
  return {
    point: ({ x, y }) => ({ x: twice - x, y }),
    place: (place) => ({ ...mirrored(place), x: twice - place.x }),
  };
}
