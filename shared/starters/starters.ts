import { BUILT_IN_PROCESSES } from '../circuit/built-in-process';
import type { Drawing } from '../circuit/drawing';
import { differentialPair } from './differential-pair';
import { fourResistorStage } from './four-resistor-stage';
import { mirror } from './mirror';

/** A ready-drawn stage to begin a sheet from. */
export type Starter = { readonly id: string; readonly name: string; readonly about: string; readonly drawing: Drawing };

export const STARTERS: readonly Starter[] = [
  {
    id: 'four-resistor-stage',
    name: 'Four-resistor biased stage',
    about: 'A common-source FET held by a gate divider and a source resistor.',
    drawing: fourResistorStage(),
  },
  {
    id: 'mirror',
    name: 'Mirror',
    about: 'A reference current copied one to two.',
    drawing: mirror(),
  },
  {
    id: 'differential-pair',
    name: 'Differential pair with mirror load',
    about: 'Two inputs, a mirrored tail and a P mirror as the load.',
    drawing: differentialPair(),
  },
];

/** An empty sheet: nothing drawn, the processes that come with the program at hand. */
export const BLANK_DRAWING: Drawing = {
  parts: [],
  wires: [],
  settings: { ground: 'gnd', temperature: 27, processes: BUILT_IN_PROCESSES },
};
