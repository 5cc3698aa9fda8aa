import type { FetModel } from './fet-model';

/** What the square law says of one device, in the N frame of its model: V, A, S. */
export interface SquareLaw {
  vt: number;
  vov: number;
  id: number;
  /** ∂ID/∂VGS */
  gm: number;
  /** ∂ID/∂VDS */
  gds: number;
  /** ∂ID/∂VBS */
  gmb: number;
}

/**
 * The square law (Shichman and Hodges, IEEE J. Solid-State Circuits 3(3), 1968, from memory) with (1 + λ·VDS) carried in
 * triode too, so that current and slope are continuous at both edges, and the body effect of the long channel. `vds` ≥ 0
 * and `vsb` are measured from the end of the channel at the lower potential. Written into `out`.
 */
export function squareLaw(model: FetModel, vgs: number, vds: number, vsb: number, out: SquareLaw): void {
  out.vt = thresholdAt(model, vsb);
  out.vov = vgs - out.vt;
  if (out.vov <= 0) {
    out.id = 0;
    out.gm = 0;
    out.gds = 0;
    out.gmb = 0;
    return;
  }
  const modulation = 1 + model.lambda * vds;
  if (vds < out.vov) {
    const flat = model.kn * (out.vov - vds / 2) * vds;
    out.id = flat * modulation;
    out.gm = model.kn * vds * modulation;
    out.gds = model.kn * (out.vov - vds) * modulation + flat * model.lambda;
  } else {
    const flat = (model.kn / 2) * out.vov * out.vov;
    out.id = flat * modulation;
    out.gm = model.kn * out.vov * modulation;
    out.gds = flat * model.lambda;
  }
  const depleted = model.surfacePotential + vsb;
  const hasBodyEffect = depleted > 0 && model.gamma > 0 && !model.bodyTied;
  out.gmb = hasBodyEffect ? (out.gm * model.gamma) / (2 * Math.sqrt(depleted)) : 0;
}

/** V, the threshold with the source `vsb` above the body: the long channel's body effect, its root clipped at zero. */
export function thresholdAt({ threshold, gamma, surfacePotential }: FetModel, vsb: number): number {
  if (gamma === 0) return threshold;
  return threshold + gamma * (Math.sqrt(Math.max(surfacePotential + vsb, 0)) - Math.sqrt(surfacePotential));
}

export function emptySquareLaw(): SquareLaw {
  return { vt: 0, vov: 0, id: 0, gm: 0, gds: 0, gmb: 0 };
}
