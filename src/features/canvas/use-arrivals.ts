import { useEffect, useRef } from 'react';
import type { DrawnPart } from '#shared/circuit/drawing';
import { around } from '#shared/geometry/box';
import type { Selection } from '../../live/selection';
import { spokenPart } from './part-text';
import type { SheetGeometry } from './sheet-geometry';
import { partBox } from './symbol-box';
import { useLatest } from './use-latest';
import type { View } from './use-view';

type Sheet = {
  readonly geometry: SheetGeometry;
  readonly view: View;
  select(selection: Selection): void;
  announce(message: string): void;
  /** A part was set down from the hand. */
  onSetDown(part: DrawnPart): void;
};

/** Things that were just put on the sheet are selected at once, and looked at as soon as the drawing has them. */
export function useArrivals(sheet: Sheet) {
  const waiting = useRef<{ how: 'set down' | 'copied'; parts: Selection['parts'] }>(undefined);
  const latest = useLatest(sheet);
  const { geometry } = sheet;
  useEffect(() => {
    const arrived = waiting.current;
    const parts = [...(arrived?.parts ?? [])].flatMap((id) => geometry.parts.get(id) ?? []);
    const [first] = parts;
    if (!arrived || !first) return;
    waiting.current = undefined;
    const { view, announce, onSetDown } = latest.current;
    if (arrived.how === 'set down') {
      announce(`Placed ${spokenPart(first)} at ${first.place.x}, ${first.place.y}.`);
      onSetDown(first);
      return;
    }
    const corners = parts.map(partBox).flatMap(({ left, top, right, bottom }) => [
      { x: left, y: top },
      { x: right, y: bottom },
    ]);
    view.reveal(around(corners));
  }, [geometry, latest]);
  const expect = (how: 'set down' | 'copied') => (selection: Selection) => {
    waiting.current = { how, parts: selection.parts };
    latest.current.select(selection);
  };
  return { setDown: expect('set down'), copied: expect('copied') };
}
