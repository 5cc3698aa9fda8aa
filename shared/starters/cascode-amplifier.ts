import { PLACED_PROCESS } from '../circuit/catalogue';
import type { Drawing } from '../circuit/drawing';
import { Sketch } from './sketch';

/** A common-source FET under a cascode whose gate a divider holds; `upperDivider` in ohms sets how high. */
export function cascodeAmplifier({ upperDivider } = { upperDivider: 75e3 }): Drawing {
  const sketch = new Sketch();
  const intent = { region: 'saturated', margin: 0.1 } as const;
  const channel = { length: 1e-6, process: PLACED_PROCESS, intent };
  const v1 = sketch.part('voltage', 'V1', 0, 210, { voltage: 1.8 });
  const r1 = sketch.part('resistor', 'R1', 160, 80, { resistance: upperDivider });
  const r2 = sketch.part('resistor', 'R2', 160, 300, { resistance: 100e3 });
  const v2 = sketch.part('voltage', 'V2', 290, 380, { voltage: 0.65 });
  const r3 = sketch.part('resistor', 'R3', 450, 50, { resistance: 12e3 });
  const q1 = sketch.part('nfet', 'Q1', 450, 330, { ...channel, width: 10e-6 });
  const q2 = sketch.part('nfet', 'Q2', 450, 190, { ...channel, width: 20e-6, bodyLedOut: true });

  const rail = sketch.junction(160, -10);
  sketch.supply('vdd', 160, -10);
  sketch.wire(v1('plus'), rail, [0, -10]);
  sketch.wire(rail, r1('a'));
  sketch.wire(rail, r3('a'), [450, -10]);

  const divider = sketch.junction(160, 190);
  sketch.netName('cas', 160, 190);
  sketch.wire(r1('b'), divider);
  sketch.wire(divider, r2('a'));
  sketch.wire(divider, q2('gate'));
  sketch.wire(q2('body'), sketch.ground(640, 200), [640, 170]);

  const out = sketch.junction(450, 110);
  sketch.wire(r3('b'), out);
  sketch.wire(out, q2('drain'));
  sketch.wire(out, sketch.netName('out', 640, 110, true));
  sketch.wire(q2('source'), q1('drain'));

  sketch.netName('in', 290, 350);
  sketch.wire(v2('plus'), q1('gate'), [290, 330]);

  sketch.wire(v1('minus'), sketch.ground(0, 430));
  sketch.wire(r2('b'), sketch.ground(160, 430));
  sketch.wire(v2('minus'), sketch.ground(290, 430));
  sketch.wire(q1('source'), sketch.ground(450, 430));
  return sketch.drawing();
}
