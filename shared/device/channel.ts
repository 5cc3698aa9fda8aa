import type { FetModel } from './fet-model';
import { emptySquareLaw, type SquareLaw, squareLaw, thresholdAt } from './square-law';

/** A channel between its labelled ends, as Kirchhoff's current law needs it. */
export interface Channel {
  /** The square law, measured from the effective source, in the model's N frame. */
  readonly law: SquareLaw;
  /** In the N frame, from the effective source. */
  vgs: number;
  vds: number;
  vsb: number;
  /** The labelled drain is at the source end. */
  reversed: boolean;
  /** A, from the labelled drain to the labelled source. */
  current: number;
  /** Slopes of `current` against each terminal's voltage, S. A tied body moves with the source and has none of its own. */
  byDrain: number;
  byGate: number;
  bySource: number;
  byBody: number;
}

export function emptyChannel(): Channel {
  return {
    law: emptySquareLaw(),
    vgs: 0,
    vds: 0,
    vsb: 0,
    reversed: false,
    current: 0,
    byDrain: 0,
    byGate: 0,
    bySource: 0,
    byBody: 0,
  };
}

/**
 * Evaluates a channel at terminal voltages to ground, written into `out`. The drain is the end at the higher potential
 * (for N), so the two labels change places when the voltages do.
 */
export function evaluateChannel(
  model: FetModel,
  drain: number,
  gate: number,
  source: number,
  body: number,
  out: Channel,
): void {
  const { sign } = model;
  const span = sign * (drain - source);
  const { law } = out;
  out.reversed = span < 0;
  const low = out.reversed ? drain : source;
  out.vgs = sign * (gate - low);
  out.vds = Math.abs(span);
  out.vsb = model.bodyTied ? 0 : sign * (low - body);
  squareLaw(model, out.vgs, out.vds, out.vsb, law);

  // Negating all voltages and the current leaves every slope as it is, so P needs the sign on the current alone.
  const direction = out.reversed ? -1 : 1;
  const atSourceEnd = -direction * (law.gm + law.gds + law.gmb);
  const atDrainEnd = direction * law.gds;
  out.current = sign * direction * law.id;
  out.byGate = direction * law.gm;
  out.byBody = direction * law.gmb;
  out.byDrain = out.reversed ? atSourceEnd : atDrainEnd;
  out.bySource = out.reversed ? atDrainEnd : atSourceEnd;
}

/** V, the overdrive alone of a channel at terminal voltages to ground. */
export function overdriveOf(model: FetModel, drain: number, gate: number, source: number, body: number): number {
  const { sign } = model;
  const low = sign * (drain - source) < 0 ? drain : source;
  return sign * (gate - low) - thresholdAt(model, model.bodyTied ? 0 : sign * (low - body));
}
