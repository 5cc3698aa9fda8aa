import { z } from 'zod';
import { regionSchema } from '../circuit/circuit-file';
import { problemSchema } from '../circuit/problem';
import { recordByName } from '../circuit/record-by-name';

export type { Region } from '../circuit/circuit-file';

/** V, A, S and W; voltages signed as measured from the effective source, `vov`, `vdsSat`, `saturationMargin` positive-is-on. */
export const fetPointSchema = z.strictObject({
  region: regionSchema,
  /** Drain to source for N, source to drain for P; negative when reversed. */
  id: z.number(),
  vgs: z.number(),
  vds: z.number(),
  vsb: z.number(),
  vt: z.number(),
  vov: z.number(),
  vdsSat: z.number(),
  saturationMargin: z.number(),
  gm: z.number(),
  gds: z.number(),
  gmb: z.number(),
  power: z.number(),
  reversed: z.boolean(),
});

/** A source's current leaves its plus (or to) terminal; power is positive when it delivers. */
export const sourcePointSchema = z.strictObject({ voltage: z.number(), current: z.number(), power: z.number() });
/** A resistor's current flows from a to b. */
export const resistorPointSchema = z.strictObject({ voltage: z.number(), current: z.number(), power: z.number() });

const pointShape = {
  nets: recordByName(z.number()),
  fets: recordByName(fetPointSchema),
  sources: recordByName(sourcePointSchema),
  resistors: recordByName(resistorPointSchema),
  /** True where the nodal Jacobian's determinant is negative: an odd number of growing modes. False means not judged. */
  surelyUnstable: z.boolean(),
};

/** Every figure of one solution. */
export const solutionSchema = z.strictObject(pointShape);

export const operatingPointRecordSchema = z.strictObject({
  status: z.enum(['solved', 'unsolved', 'invalid']),
  problems: z.array(problemSchema),
  iterations: z.number(),
  /** The largest sum of currents at any net, in amperes. */
  residual: z.number(),
  ...pointShape,
  alternatives: z.array(solutionSchema),
  alternativesSearched: z.boolean(),
});

export type FetPoint = z.infer<typeof fetPointSchema>;
export type SourcePoint = z.infer<typeof sourcePointSchema>;
export type ResistorPoint = z.infer<typeof resistorPointSchema>;
export type Solution = z.infer<typeof solutionSchema>;
export type OperatingPointRecord = z.infer<typeof operatingPointRecordSchema>;
export type PointStatus = OperatingPointRecord['status'];
