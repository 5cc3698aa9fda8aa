import { expect, test } from 'vitest';
import { drawingOf } from '#shared/circuit/import-drawing';
import { circuitWithDrawing, netlist } from '#shared/circuit/netlist';
import { STARTERS } from '#shared/starters/starters';

test('an exported sheet is imported as it was drawn', () => {
  for (const { drawing } of STARTERS) expect(drawingOf(circuitWithDrawing(drawing, 'x'))).toEqual(drawing);
});

test('a file whose parts were changed by hand counts by its parts and is laid out afresh', () => {
  for (const { drawing } of STARTERS) {
    const exported = circuitWithDrawing(drawing, 'x');
    const parts = exported.parts.map((part) => (part.kind === 'resistor' ? { ...part, resistance: 123 } : part));
    const imported = drawingOf({ ...exported, parts });
    expect(netlist(imported).circuit.parts).toEqual(
      netlist(drawing).circuit.parts.map((part) => (part.kind === 'resistor' ? { ...part, resistance: 123 } : part)),
    );
  }
});

test('a file without a drawing keeps its nets by name when laid out', () => {
  for (const { drawing } of STARTERS) {
    const { circuit } = netlist(drawing, 'x');
    expect(netlist(drawingOf(circuit), 'x').circuit).toEqual(circuit);
  }
});
