/** A supply over a ladder of so many diode-connected FETs, as a circuit file. */
export function ladder(rungs: number) {
  const nfet = { kPrime: 2e-4, threshold: 0.5, lambda: 0.05 };
  const parts: object[] = [{ ref: 'V1', kind: 'voltage', plus: 'n0', minus: 'gnd', voltage: 5 }];
  for (let i = 1; i <= rungs; i += 1) {
    parts.push({ ref: `R${i}`, kind: 'resistor', a: `n${i - 1}`, b: `n${i}`, resistance: 1000 });
    const terminals = { drain: `n${i}`, gate: `n${i}`, source: 'gnd' };
    parts.push({ ref: `Q${i}`, kind: 'nfet', ...terminals, process: 'demo', width: 1e-5, length: 1e-6 });
  }
  return { format: 'stillpoint.circuit', version: 1, ground: 'gnd', processes: { demo: { nfet } }, parts };
}
