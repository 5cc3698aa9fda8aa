import { renderToStaticMarkup } from 'react-dom/server';
import { expect, test } from 'vitest';
import { SYMBOL_PINS, type SymbolKind } from '#shared/geometry/pins';
import { GRID } from '#shared/geometry/place';
import { ownBox } from '../../../src/features/canvas/symbol-box';
import { PartSymbol } from '../../../src/features/canvas/symbols';

const KINDS = (Object.keys(SYMBOL_PINS) as SymbolKind[]).filter((kind) => kind !== 'junction');

test.each(KINDS)('the leads of a %s end on its terminals', (kind) => {
  const markup = renderToStaticMarkup(<PartSymbol kind={kind} bodyLedOut />);
  const upsideDown = markup.includes('scale(1 -1)');
  const ends = leadCorners(markup).map(({ x, y }) => ({ x, y: upsideDown ? 0 - y : y }));
  for (const { x, y } of Object.values(SYMBOL_PINS[kind])) expect(ends).toContainEqual({ x, y });
});

test('a depletion channel is one stroke, an enhancement channel three', () => {
  const strokes = (depletion: boolean) => {
    const markup = renderToStaticMarkup(<PartSymbol kind="nfet" depletion={depletion} />);
    return /class="channel"[^>]*d="([^"]*)"/.exec(markup)?.[1]?.match(/M/g)?.length;
  };
  expect(strokes(true)).toBe(1);
  expect(strokes(false)).toBe(3);
});

test.each(KINDS)('the box of a %s lies on the grid, so that snapping it snaps the symbol', (kind) => {
  for (const edge of Object.values(ownBox(kind))) expect(Math.abs(edge % GRID)).toBe(0);
});

/** Corners of the paths drawn as leads; absolute M, H and V are all that they use. */
function leadCorners(markup: string): { x: number; y: number }[] {
  const corners: { x: number; y: number }[] = [];
  for (const [, d = ''] of markup.matchAll(/class="lead" d="([^"]*)"/g)) {
    let at = { x: 0, y: 0 };
    for (const [, step, first, second] of d.matchAll(/([MHV])(-?[\d.]+)(?:\s*(-?[\d.]+))?/g)) {
      if (step === 'M') at = { x: Number(first), y: Number(second) };
      else at = step === 'H' ? { ...at, x: Number(first) } : { ...at, y: Number(first) };
      corners.push(at);
    }
  }
  return corners;
}
