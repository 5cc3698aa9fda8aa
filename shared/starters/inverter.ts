import { PLACED_PROCESS } from '../circuit/catalogue';
import type { Drawing } from '../circuit/drawing';
import { Sketch } from './sketch';

/** A CMOS inverter whose input is held at its switching threshold, where both devices are saturated. */
export function inverter(): Drawing {
  const sketch = new Sketch();
  const intent = { region: 'saturated', margin: 0.1 } as const;
  const channel = { length: 1e-6, process: PLACED_PROCESS, intent };
  const v1 = sketch.part('voltage', 'V1', 0, 160, { voltage: 1.8 });
  const v2 = sketch.part('voltage', 'V2', 160, 240, { voltage: 0.9 });
  // 3.5 times as wide, as its mobility is 3.5 times less.
  const q1 = sketch.part('nfet', 'Q1', 400, 240, { ...channel, width: 10e-6 });
  const q2 = sketch.part('pfet', 'Q2', 400, 80, { ...channel, width: 35e-6 });

  const rail = sketch.junction(400, -10);
  sketch.supply('vdd', 400, -10);
  sketch.wire(v1('plus'), rail, [0, -10]);
  sketch.wire(rail, q2('source'));

  const input = sketch.junction(300, 160);
  sketch.netName('in', 160, 210);
  sketch.wire(v2('plus'), input, [160, 160]);
  sketch.wire(input, q2('gate'), [300, 80]);
  sketch.wire(input, q1('gate'), [300, 240]);

  const out = sketch.junction(400, 160);
  sketch.wire(q2('drain'), out);
  sketch.wire(out, q1('drain'));
  sketch.wire(out, sketch.netName('out', 590, 160, true));

  sketch.wire(v1('minus'), sketch.ground(0, 320));
  sketch.wire(v2('minus'), sketch.ground(160, 320));
  sketch.wire(q1('source'), sketch.ground(400, 320));
  return sketch.drawing();
}
