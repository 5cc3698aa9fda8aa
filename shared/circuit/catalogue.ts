import type { Quantity } from '../units/parse-value';
import type { DrawnComponent, DrawnKind, DrawnPart } from './drawing';

/** What the tray, the slip and the ledger need to know of a kind of part. */
export type CatalogueEntry = {
  readonly kind: DrawnKind;
  /** As a person reads it, within a sentence. */
  readonly label: string;
  /** The key that places it; junctions have none, ends that meet make the dot. */
  readonly letter?: string;
  /** IEEE 315 reference letter, for parts that carry one. */
  readonly refLetter?: string;
  /** The values a part is born with, in SI base units. */
  readonly initialValues: DrawnPart['values'];
};

/** The process that placed FETs use. */
export const PLACED_PROCESS = 'buoy-3';

const CHANNEL = { width: 10e-6, length: 1e-6, process: PLACED_PROCESS };

/** Every kind of part, in the order of the tray. */
export const CATALOGUE: readonly CatalogueEntry[] = [
  { kind: 'nfet', label: 'N-channel FET', letter: 'n', refLetter: 'Q', initialValues: CHANNEL },
  { kind: 'pfet', label: 'P-channel FET', letter: 'p', refLetter: 'Q', initialValues: CHANNEL },
  { kind: 'resistor', label: 'resistor', letter: 'r', refLetter: 'R', initialValues: { resistance: 10e3 } },
  { kind: 'capacitor', label: 'capacitor', letter: 'c', refLetter: 'C', initialValues: { capacitance: 1e-9 } },
  { kind: 'inductor', label: 'inductor', letter: 'l', refLetter: 'L', initialValues: { inductance: 1e-6 } },
  { kind: 'voltage', label: 'voltage source', letter: 'v', refLetter: 'V', initialValues: { voltage: 1.8 } },
  { kind: 'current', label: 'current source', letter: 'i', refLetter: 'I', initialValues: { current: 10e-6 } },
  { kind: 'ground', label: 'ground', letter: 'g', initialValues: {} },
  { kind: 'supply', label: 'supply', letter: 'u', initialValues: { net: 'vdd' } },
  { kind: 'net-name', label: 'net name', letter: 't', initialValues: { net: 'net1' } },
  { kind: 'note', label: 'note', letter: 'x', initialValues: { text: 'note' } },
  { kind: 'junction', label: 'junction', initialValues: {} },
];

export function catalogueEntry(kind: DrawnKind): CatalogueEntry {
  const entry = CATALOGUE.find((candidate) => candidate.kind === kind);
  if (!entry) throw new Error(`no part kind ${kind}`);
  return entry;
}

/** A field of a slip: the name of a part's value, what it is called, and how it is read. */
export type ValueField = { readonly name: string; readonly label: string; readonly quantity: Quantity };

/** The main values of a part that are typed as quantities, in the order of the slip. */
export function valueFields(part: DrawnComponent): readonly ValueField[] {
  switch (part.kind) {
    case 'nfet':
    case 'pfet':
      return part.values.k === undefined
        ? [
            { name: 'width', label: 'W', quantity: { unit: 'm', bareExponent: -6 } },
            { name: 'length', label: 'L', quantity: { unit: 'm', bareExponent: -6 } },
          ]
        : [{ name: 'k', label: 'k', quantity: { unit: 'A/V²' } }];
    case 'resistor':
      return [{ name: 'resistance', label: 'R', quantity: { unit: 'Ω' } }];
    case 'capacitor':
      return [{ name: 'capacitance', label: 'C', quantity: { unit: 'F' } }];
    case 'inductor':
      return [{ name: 'inductance', label: 'L', quantity: { unit: 'H' } }];
    case 'voltage':
      return [{ name: 'voltage', label: 'V', quantity: { unit: 'V' } }];
    case 'current':
      return [{ name: 'current', label: 'I', quantity: { unit: 'A' } }];
  }
}
