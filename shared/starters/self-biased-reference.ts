import { PLACED_PROCESS } from '../circuit/catalogue';
import type { Drawing } from '../circuit/drawing';
import { Sketch } from './sketch';

/**
 * A reference current that sets itself by the difference of two gate-source voltages over R1. Without the resistor that
 * starts it, it has a second operating point at which no current flows.
 */
export function selfBiasedReference({ withStart } = { withStart: true }): Drawing {
  const sketch = new Sketch();
  const channel = (width: number) => ({ width, length: 1e-6, process: PLACED_PROCESS });
  const intent = { region: 'saturated', margin: 0.1 } as const;
  const v1 = sketch.part('voltage', 'V1', 0, 230, { voltage: 1.8 });
  const r1 = sketch.part('resistor', 'R1', 640, 420, { resistance: 1.2e3 });
  const r2 = sketch.part('resistor', 'R2', 900, 420, { resistance: 6.8e3 });
  const q1 = sketch.part('nfet', 'Q1', 340, 320, { ...channel(10e-6), intent }, true);
  const q2 = sketch.part('nfet', 'Q2', 640, 320, { ...channel(10e-6), count: 4, bodyLedOut: true, intent });
  const q3 = sketch.part('pfet', 'Q3', 340, 100, { ...channel(20e-6), intent }, true);
  const q4 = sketch.part('pfet', 'Q4', 640, 100, { ...channel(20e-6), intent });
  const q5 = sketch.part('pfet', 'Q5', 900, 100, { ...channel(20e-6), intent });

  const railQ3 = sketch.junction(340, 0);
  const railQ4 = sketch.junction(640, 0);
  sketch.supply('vdd', 340, 0);
  sketch.wire(railQ3, q3('source'));
  sketch.wire(railQ3, railQ4);
  sketch.wire(railQ4, q4('source'));
  sketch.wire(railQ4, q5('source'), [900, 0]);

  const pGates = sketch.junction(560, 100);
  const pDrain = sketch.junction(640, 190);
  sketch.netName('gp', 560, 100);
  sketch.wire(q3('gate'), pGates);
  sketch.wire(pGates, q4('gate'));
  sketch.wire(pGates, pDrain, [560, 190]);
  sketch.wire(q4('drain'), pDrain);
  sketch.wire(pDrain, q5('gate'), [820, 190], [820, 100]);
  sketch.wire(pDrain, q2('drain'));

  const nDrain = sketch.junction(340, 230);
  const nGates = sketch.junction(420, 320);
  sketch.netName('gn', 420, 320);
  sketch.wire(q3('drain'), nDrain);
  sketch.wire(nDrain, q1('drain'));
  sketch.wire(nDrain, nGates, [420, 230]);
  sketch.wire(q1('gate'), nGates);
  sketch.wire(nGates, q2('gate'));
  sketch.wire(q2('source'), r1('a'));
  sketch.wire(q2('body'), sketch.ground(820, 330), [820, 300]);

  if (withStart) {
    const r3 = sketch.part('resistor', 'R3', 120, 120, { resistance: 1e6 });
    const railR3 = sketch.junction(120, 0);
    sketch.wire(v1('plus'), railR3, [0, 0]);
    sketch.wire(railR3, railQ3);
    sketch.wire(railR3, r3('a'));
    sketch.wire(r3('b'), nDrain, [120, 230]);
  } else {
    sketch.wire(v1('plus'), railQ3, [0, 0]);
  }

  const out = sketch.junction(900, 230);
  sketch.wire(q5('drain'), out);
  sketch.wire(out, r2('a'));
  sketch.wire(out, sketch.netName('out', 1080, 230, true));

  sketch.wire(v1('minus'), sketch.ground(0, 490));
  sketch.wire(q1('source'), sketch.ground(340, 490));
  sketch.wire(r1('b'), sketch.ground(640, 490));
  sketch.wire(r2('b'), sketch.ground(900, 490));
  return sketch.drawing();
}
