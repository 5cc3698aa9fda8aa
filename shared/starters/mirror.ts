import { PLACED_PROCESS } from '../circuit/catalogue';
import type { Drawing } from '../circuit/drawing';
import { Sketch } from './sketch';

/** A current mirror, one to two by count, fed by a resistor. */
export function mirror(): Drawing {
  const sketch = new Sketch();
  const channel = { width: 10e-6, length: 1e-6, process: PLACED_PROCESS };
  const intent = { region: 'saturated', margin: 0.1 } as const;
  const v1 = sketch.part('voltage', 'V1', 0, 130, { voltage: 1.8 });
  const r1 = sketch.part('resistor', 'R1', 220, 50, { resistance: 22e3 });
  const r2 = sketch.part('resistor', 'R2', 420, 50, { resistance: 8.2e3 });
  const q1 = sketch.part('nfet', 'Q1', 220, 200, { ...channel, intent }, true);
  const q2 = sketch.part('nfet', 'Q2', 420, 200, { ...channel, count: 2, intent });
  const rail = sketch.junction(220, -10);
  sketch.supply('vdd', 220, -10);
  sketch.wire(v1('plus'), rail, [0, -10]);
  sketch.wire(rail, r1('a'));
  sketch.wire(rail, r2('a'), [420, -10]);
  const drain = sketch.junction(220, 120);
  const gates = sketch.junction(290, 200);
  sketch.netName('ref', 290, 200);
  sketch.wire(r1('b'), drain);
  sketch.wire(drain, q1('drain'));
  sketch.wire(drain, gates, [290, 120]);
  sketch.wire(q1('gate'), gates);
  sketch.wire(gates, q2('gate'));
  const out = sketch.junction(420, 120);
  sketch.wire(r2('b'), out);
  sketch.wire(out, q2('drain'));
  sketch.wire(out, sketch.netName('out', 500, 120, true));
  sketch.wire(v1('minus'), sketch.ground(0, 270));
  sketch.wire(q1('source'), sketch.ground(220, 270));
  sketch.wire(q2('source'), sketch.ground(420, 270));
  return sketch.drawing();
}
