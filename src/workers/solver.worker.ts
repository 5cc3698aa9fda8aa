import { expose } from 'comlink';
import { traceLoadLine } from '#shared/analyses/load-line';
import { type FirstOperatingPoint, firstOperatingPoint, searchAlternatives } from '#shared/analyses/operating-point';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import { readCircuit } from '#shared/circuit/read-circuit';
import { KnownTopology } from '#shared/solver/known-topology';
import { inSlices } from './in-slices';

/** Most edits change a value and no wire: what the wiring decides is kept from one to the next. */
const known = new KnownTopology();
let last: { readonly circuit: CircuitFile; first: FirstOperatingPoint } | undefined;
let lineAskedFor: symbol | undefined;

const exposed = {
  firstPoint(circuit: CircuitFile) {
    const first = firstOperatingPoint(circuit, known);
    last = { circuit, first };
    return first.record;
  },
  /** Of the circuit that was solved last, with the search for further points; undefined when another comes before it is done. */
  async searchedPoint() {
    const searched = last;
    if (!searched) return undefined;
    const record = await inSlices(searchAlternatives(searched.first), () => last === searched);
    if (record) searched.first = { ...searched.first, record };
    return record;
  },
  /** Of the circuit that was solved last; undefined when another circuit, or another line, comes before it is done. */
  async loadLine(ref: string, voltages: readonly number[]) {
    const asked = Symbol('line');
    lineAskedFor = asked;
    const solved = last;
    if (!solved) return undefined;
    const read = readCircuit(solved.circuit);
    if (!read.ok) return undefined;
    const trace = traceLoadLine(read.circuit, solved.first.record, ref, voltages);
    return inSlices(trace, () => last === solved && lineAskedFor === asked);
  },
};

export type SolverWorker = typeof exposed;

expose(exposed);
