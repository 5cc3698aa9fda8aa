import { vi } from 'vitest';

/** What a chart asks of a browser and jsdom lacks; everything drawn goes nowhere. Lasts until globals are unstubbed. */
export function stubDrawing(): void {
  const nowhere: object = new Proxy(
    {},
    { get: (target, name) => Reflect.get(target, name) ?? (() => ({ width: 0 })), set: Reflect.set },
  );
  vi.stubGlobal('matchMedia', () => ({ matches: false, addEventListener() {}, removeEventListener() {} }));
  vi.stubGlobal(
    'Path2D',
    class {
      moveTo() {}
      lineTo() {}
      rect() {}
      arc() {}
    },
  );
  vi.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(nowhere as CanvasRenderingContext2D);
}
