import { expose } from 'comlink';
import { traceLoadLine } from '#shared/analyses/load-line';
import { operatingPoint } from '#shared/analyses/operating-point';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import { readCircuit } from '#shared/circuit/read-circuit';
import { inSlices } from './in-slices';

let last: { readonly circuit: CircuitFile; readonly record: OperatingPointRecord } | undefined;
let question = 0;

const exposed = {
  operatingPoint(circuit: CircuitFile): OperatingPointRecord {
    question += 1;
    const record = operatingPoint(circuit);
    last = { circuit, record };
    return record;
  },
  /** Of the circuit that was solved last; undefined as well when another question comes before it is done. */
  async loadLine(ref: string, voltages: readonly number[]) {
    question += 1;
    const asked = question;
    if (!last) return undefined;
    const read = readCircuit(last.circuit);
    if (!read.ok) return undefined;
    return inSlices(traceLoadLine(read.circuit, last.record, ref, voltages), () => question === asked);
  },
};

export type SolverWorker = typeof exposed;

expose(exposed);
