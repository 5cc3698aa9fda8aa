import type { Drawing } from '#shared/circuit/drawing';
import { cascodeAmplifier } from '#shared/starters/cascode-amplifier';
import { differentialPair } from '#shared/starters/differential-pair';
import { fourResistorStage } from '#shared/starters/four-resistor-stage';
import { outputDriver } from '#shared/starters/output-driver';
import { selfBiasedReference } from '#shared/starters/self-biased-reference';

interface DemoSheet {
  readonly name: string;
  /** The e-mail address of whoever began it. */
  readonly begunBy: string;
  /** When it was last changed. */
  readonly daysAgo: number;
  readonly drawing: Drawing;
}

/** The preamplifier's stages as the team has them: some settled, some with something still to mend. */
export function demoSheets(): readonly DemoSheet[] {
  return [
    {
      // Its tail has no room and its load draws one input thin.
      name: 'Hydrophone input pair',
      begunBy: 'samir@buoy.example',
      daysAgo: 0.02,
      drawing: differentialPair({ tailWidth: 5e-6, loadResistance: 120e3, commonMode: 0.8 }),
    },
    {
      // The cascode's gate lies too low for the FET under it.
      name: 'Second stage, cascode',
      begunBy: 'samir@buoy.example',
      daysAgo: 0.2,
      drawing: cascodeAmplifier({ upperDivider: 120e3 }),
    },
    {
      // Nothing starts it: it has a second operating point at which no current flows.
      name: 'Bias reference',
      begunBy: 'ines@buoy.example',
      daysAgo: 1.1,
      drawing: selfBiasedReference({ withStart: false }),
    },
    { name: 'First stage', begunBy: 'samir@buoy.example', daysAgo: 3.3, drawing: fourResistorStage() },
    { name: 'Cable driver, 12 V', begunBy: 'ines@buoy.example', daysAgo: 9.2, drawing: outputDriver() },
  ];
}
