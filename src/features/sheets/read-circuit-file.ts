/** 60 FETs come to about 30 kB; what is far beyond that is another kind of file. */
const MOST_BYTES = 1_000_000;

export type CircuitFile =
  | { readonly ok: true; readonly circuit: unknown; readonly title: string | undefined }
  | { readonly ok: false; readonly message: string; readonly problems: readonly string[] };

/** Reads a file somebody chose as a circuit; what is wrong with it is said in full before anything is sent. */
export async function readCircuitFile(file: File): Promise<CircuitFile> {
  if (file.size > MOST_BYTES) {
    return wrong('This file is larger than 1 MB, which no circuit of a sheet’s size needs. Choose another file.');
  }
  let circuit: unknown;
  try {
    circuit = JSON.parse(await file.text());
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    return wrong(`This file is not JSON text: ${reason}. Correct it there, or choose another file.`);
  }
  // Fetched with the first file: no other part of these pages reads circuits.
  const { readCircuit } = await import('#shared/circuit/read-circuit');
  const read = readCircuit(circuit);
  if (!read.ok) {
    const problems = read.problems.filter((one) => one.severity === 'error').map((one) => one.message);
    return wrong('This file is not a circuit that can be solved. Correct it, then choose it again.', problems);
  }
  return { ok: true, circuit, title: read.circuit.title };
}

function wrong(message: string, problems: readonly string[] = []): CircuitFile {
  return { ok: false, message, problems };
}
