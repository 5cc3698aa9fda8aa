import { PLACED_PROCESS } from '../circuit/catalogue';
import type { Drawing } from '../circuit/drawing';
import { Sketch } from './sketch';

/** A common-source stage biased by a divider and a source resistor. */
export function fourResistorStage(): Drawing {
  const sketch = new Sketch();
  const v1 = sketch.part('voltage', 'V1', 0, 160, { voltage: 1.8 });
  const r1 = sketch.part('resistor', 'R1', 160, 60, { resistance: 100e3 });
  const r2 = sketch.part('resistor', 'R2', 160, 240, { resistance: 100e3 });
  const r3 = sketch.part('resistor', 'R3', 340, 50, { resistance: 8.2e3 });
  const r4 = sketch.part('resistor', 'R4', 340, 240, { resistance: 2e3 });
  const q1 = sketch.part('nfet', 'Q1', 340, 160, {
    width: 10e-6,
    length: 1e-6,
    process: PLACED_PROCESS,
    intent: { region: 'saturated', margin: 0.1 },
  });
  const rail = sketch.junction(160, -10);
  sketch.supply('vdd', 160, -10);
  sketch.wire(v1('plus'), rail, [0, -10]);
  sketch.wire(rail, r1('a'));
  sketch.wire(rail, r3('a'), [340, -10]);
  const gate = sketch.junction(160, 160);
  sketch.netName('in', 160, 160);
  sketch.wire(r1('b'), gate);
  sketch.wire(gate, r2('a'));
  sketch.wire(gate, q1('gate'));
  const out = sketch.junction(340, 100);
  sketch.wire(r3('b'), out);
  sketch.wire(out, q1('drain'));
  sketch.wire(out, sketch.netName('out', 430, 100, true));
  sketch.wire(q1('source'), r4('a'));
  sketch.wire(v1('minus'), sketch.ground(0, 300));
  sketch.wire(r2('b'), sketch.ground(160, 300));
  sketch.wire(r4('b'), sketch.ground(340, 300));
  return sketch.drawing();
}
