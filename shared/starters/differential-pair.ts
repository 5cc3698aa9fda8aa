import { PLACED_PROCESS } from '../circuit/catalogue';
import type { Drawing } from '../circuit/drawing';
import { Sketch } from './sketch';

/** What is chosen in a differential pair; metres, ohms, volts. */
export type DifferentialPairValues = {
  readonly tailWidth: number;
  readonly loadResistance: number;
  readonly commonMode: number;
};

const ALL_MET: DifferentialPairValues = { tailWidth: 20e-6, loadResistance: 150e3, commonMode: 0.85 };

/** A differential pair with a mirror load and a mirrored tail. */
export function differentialPair({ tailWidth, loadResistance, commonMode } = ALL_MET): Drawing {
  const sketch = new Sketch();
  const channel = (width: number) => ({ width, length: 1e-6, process: PLACED_PROCESS });
  const wanted = (margin: number) => ({ intent: { region: 'saturated', margin } as const });
  const v1 = sketch.part('voltage', 'V1', 70, 340, { voltage: 1.8 });
  const v2 = sketch.part('voltage', 'V2', 900, 390, { voltage: commonMode });
  const r1 = sketch.part('resistor', 'R1', 250, 280, { resistance: 27e3 });
  const r2 = sketch.part('resistor', 'R2', 1020, 360, { resistance: loadResistance });
  const q1 = sketch.part('nfet', 'Q1', 420, 340, { ...channel(8e-6), ...wanted(0.1) });
  const q2 = sketch.part('nfet', 'Q2', 740, 340, { ...channel(8e-6), ...wanted(0.1) }, true);
  const q3 = sketch.part('pfet', 'Q3', 420, 170, { ...channel(10e-6), ...wanted(0.1) }, true);
  const q4 = sketch.part('pfet', 'Q4', 740, 170, { ...channel(10e-6), ...wanted(0.1) });
  const q5 = sketch.part('nfet', 'Q5', 250, 520, { ...channel(tailWidth), ...wanted(0.1) }, true);
  const q6 = sketch.part('nfet', 'Q6', 580, 520, { ...channel(tailWidth), count: 2, ...wanted(0.05) });

  const railR1 = sketch.junction(250, 100);
  const railQ3 = sketch.junction(420, 100);
  sketch.supply('vdd', 250, 100);
  sketch.wire(v1('plus'), railR1, [70, 100]);
  sketch.wire(railR1, r1('a'));
  sketch.wire(railR1, railQ3);
  sketch.wire(railQ3, q3('source'));
  sketch.wire(railQ3, q4('source'), [740, 100]);

  const gates = sketch.junction(500, 170);
  const mirrorInput = sketch.junction(420, 240);
  sketch.netName('mir', 500, 170);
  sketch.wire(q3('gate'), gates);
  sketch.wire(gates, q4('gate'));
  sketch.wire(gates, mirrorInput, [500, 240]);
  sketch.wire(q3('drain'), mirrorInput);
  sketch.wire(mirrorInput, q1('drain'));

  const out = sketch.junction(740, 250);
  sketch.netName('out', 740, 250);
  sketch.wire(q4('drain'), out);
  sketch.wire(out, q2('drain'));
  sketch.wire(out, r2('a'), [1020, 250]);

  sketch.wire(sketch.netName('vcm', 340, 340), q1('gate'));
  sketch.netName('vcm', 900, 360);
  sketch.wire(q2('gate'), v2('plus'), [900, 340]);

  const tail = sketch.junction(580, 400);
  sketch.netName('tail', 580, 400);
  sketch.wire(q1('source'), tail, [420, 400]);
  sketch.wire(q2('source'), tail, [740, 400]);
  sketch.wire(tail, q6('drain'));

  const reference = sketch.junction(250, 450);
  const tailGates = sketch.junction(330, 520);
  sketch.netName('ref', 330, 520);
  sketch.wire(r1('b'), reference);
  sketch.wire(reference, q5('drain'));
  sketch.wire(reference, tailGates, [330, 450]);
  sketch.wire(q5('gate'), tailGates);
  sketch.wire(tailGates, q6('gate'));

  sketch.wire(v1('minus'), sketch.ground(70, 580));
  sketch.wire(q5('source'), sketch.ground(250, 580));
  sketch.wire(q6('source'), sketch.ground(580, 580));
  sketch.wire(v2('minus'), sketch.ground(900, 440));
  sketch.wire(r2('b'), sketch.ground(1020, 440));
  return sketch.drawing();
}
