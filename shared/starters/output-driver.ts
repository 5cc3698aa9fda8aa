import { DISCRETE_PROCESS } from '../circuit/built-in-process';
import type { Drawing } from '../circuit/drawing';
import { Sketch } from './sketch';

/** A complementary output driver of discrete FETs at 12 V: two diode-connected devices set the idle current. */
export function outputDriver(): Drawing {
  const sketch = new Sketch();
  const intent = { region: 'saturated', margin: 1 } as const;
  const idle = { k: 0.05, process: DISCRETE_PROCESS, intent };
  const output = { ...idle, k: 0.2 };
  const v1 = sketch.part('voltage', 'V1', 0, 260, { voltage: 12 });
  const v2 = sketch.part('voltage', 'V2', 120, 390, { voltage: 0 });
  const c1 = sketch.part('capacitor', 'C1', 200, 260, { capacitance: 1e-6 }, false, 3);
  const r1 = sketch.part('resistor', 'R1', 400, 50, { resistance: 680 });
  const r2 = sketch.part('resistor', 'R2', 400, 470, { resistance: 680 });
  const q1 = sketch.part('nfet', 'Q1', 400, 200, idle, true);
  const q2 = sketch.part('pfet', 'Q2', 400, 320, idle, true);
  const q3 = sketch.part('nfet', 'Q3', 700, 110, output);
  const q4 = sketch.part('pfet', 'Q4', 700, 410, output);
  const r3 = sketch.part('resistor', 'R3', 700, 190, { resistance: 10 });
  const r4 = sketch.part('resistor', 'R4', 700, 330, { resistance: 10 });
  const c2 = sketch.part('capacitor', 'C2', 840, 260, { capacitance: 100e-6 }, false, 3);
  const r5 = sketch.part('resistor', 'R5', 940, 390, { resistance: 100 });

  const rail = sketch.junction(400, -10);
  sketch.supply('vdd', 400, -10);
  sketch.wire(v1('plus'), rail, [0, -10]);
  sketch.wire(rail, r1('a'));
  sketch.wire(rail, q3('drain'), [700, -10]);

  const upper = sketch.junction(400, 110);
  const upperGates = sketch.junction(520, 110);
  sketch.netName('gn', 520, 110);
  sketch.wire(r1('b'), upper);
  sketch.wire(upper, q1('drain'));
  sketch.wire(upper, upperGates);
  sketch.wire(upperGates, q1('gate'), [520, 200]);
  sketch.wire(upperGates, q3('gate'));

  const lower = sketch.junction(400, 410);
  const lowerGates = sketch.junction(520, 410);
  sketch.netName('gp', 520, 410);
  sketch.wire(q2('drain'), lower);
  sketch.wire(lower, r2('a'));
  sketch.wire(lower, lowerGates);
  sketch.wire(lowerGates, q2('gate'), [520, 320]);
  sketch.wire(lowerGates, q4('gate'));

  const middle = sketch.junction(400, 260);
  sketch.netName('mid', 400, 260);
  sketch.netName('in', 120, 360);
  sketch.wire(v2('plus'), c1('a'), [120, 260]);
  sketch.wire(c1('b'), middle);
  sketch.wire(q1('source'), middle);
  sketch.wire(middle, q2('source'));

  const out = sketch.junction(700, 260);
  sketch.netName('out', 700, 260);
  sketch.wire(q3('source'), r3('a'));
  sketch.wire(r3('b'), out);
  sketch.wire(out, r4('a'));
  sketch.wire(r4('b'), q4('source'));
  sketch.wire(out, c2('a'));
  sketch.wire(c2('b'), r5('a'), [940, 260]);
  sketch.netName('load', 940, 360);

  sketch.wire(v1('minus'), sketch.ground(0, 540));
  sketch.wire(v2('minus'), sketch.ground(120, 540));
  sketch.wire(r2('b'), sketch.ground(400, 540));
  sketch.wire(q4('drain'), sketch.ground(700, 540));
  sketch.wire(r5('b'), sketch.ground(940, 540));
  return sketch.drawing();
}
