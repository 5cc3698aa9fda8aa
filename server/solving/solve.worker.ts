import { parentPort } from 'node:worker_threads';
import { operatingPoint } from '#shared/analyses/operating-point';

parentPort?.on('message', (circuit: unknown) => parentPort?.postMessage(operatingPoint(circuit)));
