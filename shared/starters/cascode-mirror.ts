import { PLACED_PROCESS } from '../circuit/catalogue';
import type { Drawing } from '../circuit/drawing';
import { Sketch } from './sketch';

/** A mirror of two FETs a side, the upper ones with their bodies at ground. */
export function cascodeMirror(): Drawing {
  const sketch = new Sketch();
  const intent = { region: 'saturated', margin: 0.1 } as const;
  const lower = { width: 20e-6, length: 1e-6, process: PLACED_PROCESS, intent };
  const upper = { ...lower, bodyLedOut: true };
  const v1 = sketch.part('voltage', 'V1', 0, 210, { voltage: 1.8 });
  const r1 = sketch.part('resistor', 'R1', 300, 50, { resistance: 10e3 });
  const r2 = sketch.part('resistor', 'R2', 540, 50, { resistance: 10e3 });
  const q1 = sketch.part('nfet', 'Q1', 300, 370, lower, true);
  const q2 = sketch.part('nfet', 'Q2', 540, 370, lower);
  const q3 = sketch.part('nfet', 'Q3', 300, 200, upper, true);
  const q4 = sketch.part('nfet', 'Q4', 540, 200, upper);

  const rail = sketch.junction(300, -10);
  sketch.supply('vdd', 300, -10);
  sketch.wire(v1('plus'), rail, [0, -10]);
  sketch.wire(rail, r1('a'));
  sketch.wire(rail, r2('a'), [540, -10]);

  const top = sketch.junction(300, 120);
  const upperGates = sketch.junction(380, 200);
  sketch.netName('cas', 380, 200);
  sketch.wire(r1('b'), top);
  sketch.wire(top, q3('drain'));
  sketch.wire(top, upperGates, [380, 120]);
  sketch.wire(q3('gate'), upperGates);
  sketch.wire(upperGates, q4('gate'));
  sketch.wire(q3('body'), sketch.ground(110, 210), [110, 180]);
  sketch.wire(q4('body'), sketch.ground(730, 210), [730, 180]);

  const middle = sketch.junction(300, 290);
  const lowerGates = sketch.junction(380, 370);
  sketch.netName('ref', 380, 370);
  sketch.wire(q3('source'), middle);
  sketch.wire(middle, q1('drain'));
  sketch.wire(middle, lowerGates, [380, 290]);
  sketch.wire(q1('gate'), lowerGates);
  sketch.wire(lowerGates, q2('gate'));
  sketch.wire(q4('source'), q2('drain'));

  const out = sketch.junction(540, 120);
  sketch.wire(r2('b'), out);
  sketch.wire(out, q4('drain'));
  sketch.wire(out, sketch.netName('out', 730, 120, true));

  sketch.wire(v1('minus'), sketch.ground(0, 450));
  sketch.wire(q1('source'), sketch.ground(300, 450));
  sketch.wire(q2('source'), sketch.ground(540, 450));
  return sketch.drawing();
}
