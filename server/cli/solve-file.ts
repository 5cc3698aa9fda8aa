import { readFile } from 'node:fs/promises';
import { text } from 'node:stream/consumers';
import { operatingPoint, withoutSolution } from '#shared/analyses/operating-point';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { problem } from '#shared/circuit/problem';

/** The record of one circuit file, `-` being standard input. A file that can't be read, or isn't JSON, is invalid. */
export async function solveFile(file: string, stdin: NodeJS.ReadableStream): Promise<OperatingPointRecord> {
  const name = file === '-' ? 'Standard input' : file;
  let content: string;
  try {
    content = file === '-' ? await text(stdin) : await readFile(file, 'utf8');
  } catch (error) {
    return invalid(`${name} cannot be read: ${reason(error)}. Check its name and your right to read it.`);
  }
  let circuit: unknown;
  try {
    circuit = JSON.parse(content);
  } catch (error) {
    return invalid(`${name} is not JSON: ${reason(error)}.`);
  }
  return operatingPoint(circuit);
}

function invalid(message: string): OperatingPointRecord {
  return withoutSolution('invalid', [problem('bad-value', message)]);
}

function reason(error: unknown): string {
  return error instanceof Error ? error.message : String(error);
}
