import { BUILT_IN_PROCESSES } from '../circuit/built-in-process';
import type { Drawing } from '../circuit/drawing';
import { cascodeAmplifier } from './cascode-amplifier';
import { cascodeMirror } from './cascode-mirror';
import { differentialPair } from './differential-pair';
import { fourResistorStage } from './four-resistor-stage';
import { inverter } from './inverter';
import { mirror } from './mirror';
import { outputDriver } from './output-driver';
import { selfBiasedReference } from './self-biased-reference';
import { sourceFollower } from './source-follower';
import { STARTER_TITLES, type StarterId, type StarterTitle } from './starter-titles';

/** A ready-drawn stage to begin a sheet from. */
export type Starter = StarterTitle & { readonly drawing: Drawing };

const DRAWINGS: Readonly<Record<StarterId, Drawing>> = {
  'four-resistor-stage': fourResistorStage(),
  'source-follower': sourceFollower(),
  mirror: mirror(),
  'cascode-mirror': cascodeMirror(),
  'self-biased-reference': selfBiasedReference(),
  'differential-pair': differentialPair(),
  'cascode-amplifier': cascodeAmplifier(),
  inverter: inverter(),
  'output-driver': outputDriver(),
};

export const STARTERS: readonly Starter[] = STARTER_TITLES.map((title) => ({ ...title, drawing: DRAWINGS[title.id] }));

/** An empty sheet: nothing drawn, the processes that come with the program at hand. */
export const BLANK_DRAWING: Drawing = {
  parts: [],
  wires: [],
  settings: { ground: 'gnd', temperature: 27, processes: BUILT_IN_PROCESSES },
};
