import { expose } from 'comlink';
import { operatingPoint } from '#shared/analyses/operating-point';

const exposed = { operatingPoint };

export type SolverWorker = typeof exposed;

expose(exposed);
