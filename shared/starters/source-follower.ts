import { PLACED_PROCESS } from '../circuit/catalogue';
import type { Drawing } from '../circuit/drawing';
import { Sketch } from './sketch';

/** A source follower on a mirrored sink; its body lies at ground, so that its threshold rises with the output. */
export function sourceFollower(): Drawing {
  const sketch = new Sketch();
  const intent = { region: 'saturated', margin: 0.1 } as const;
  const sink = { width: 10e-6, length: 1e-6, process: PLACED_PROCESS, intent };
  const v1 = sketch.part('voltage', 'V1', 0, 200, { voltage: 1.8 });
  const r1 = sketch.part('resistor', 'R1', 220, 60, { resistance: 22e3 });
  const v2 = sketch.part('voltage', 'V2', 340, 190, { voltage: 1.3 });
  const q1 = sketch.part('nfet', 'Q1', 480, 120, { ...sink, width: 20e-6, bodyLedOut: true });
  const q2 = sketch.part('nfet', 'Q2', 220, 310, sink, true);
  const q3 = sketch.part('nfet', 'Q3', 480, 310, sink);

  const rail = sketch.junction(220, -10);
  sketch.supply('vdd', 220, -10);
  sketch.wire(v1('plus'), rail, [0, -10]);
  sketch.wire(rail, r1('a'));
  sketch.wire(rail, q1('drain'), [480, -10]);

  sketch.netName('in', 340, 160);
  sketch.wire(v2('plus'), q1('gate'), [340, 120]);
  sketch.wire(v2('minus'), sketch.ground(340, 230));
  sketch.wire(q1('body'), sketch.ground(670, 130), [670, 100]);

  const drain = sketch.junction(220, 230);
  const gates = sketch.junction(300, 310);
  sketch.netName('ref', 300, 310);
  sketch.wire(r1('b'), drain);
  sketch.wire(drain, q2('drain'));
  sketch.wire(drain, gates, [300, 230]);
  sketch.wire(q2('gate'), gates);
  sketch.wire(gates, q3('gate'));

  const out = sketch.junction(480, 210);
  sketch.wire(q1('source'), out);
  sketch.wire(out, q3('drain'));
  sketch.wire(out, sketch.netName('out', 670, 210, true));

  sketch.wire(v1('minus'), sketch.ground(0, 390));
  sketch.wire(q2('source'), sketch.ground(220, 390));
  sketch.wire(q3('source'), sketch.ground(480, 390));
  return sketch.drawing();
}
