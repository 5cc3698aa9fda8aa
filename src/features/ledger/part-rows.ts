import type { Solution } from '#shared/analyses/operating-point-record';
import { valueFields } from '#shared/circuit/catalogue';
import { type Drawing, type DrawnComponent, isComponent, isFet } from '#shared/circuit/drawing';
import { type DrawnNets, terminalKey } from '#shared/circuit/nets';
import { byReference } from '#shared/circuit/reference-order';
import { formatValue } from '#shared/units/format-value';

/** A part that is no FET, with its figures where the circuit is solved and the record has them. */
export type PartRow = {
  readonly part: DrawnComponent;
  readonly value: string;
  /** The value with more digits, for a hover. */
  readonly preciseValue: string;
  /** The value in its SI unit, to sort by. */
  readonly size: number;
  readonly voltage: number | undefined;
  readonly current: number | undefined;
  readonly power: number | undefined;
};

export function partRows(drawing: Drawing, solution: Solution | undefined): PartRow[] {
  return drawing.parts
    .filter(isComponent)
    .filter((part) => !isFet(part))
    .sort((a, b) => byReference(a.ref, b.ref))
    .map((part) => {
      const point = solution && (own(solution.sources, part.ref) ?? own(solution.resistors, part.ref));
      return { part, ...valueTexts(part), voltage: point?.voltage, current: point?.current, power: point?.power };
    });
}

function valueTexts(part: DrawnComponent): Pick<PartRow, 'value' | 'preciseValue' | 'size'> {
  const [field] = valueFields(part);
  const values: Readonly<Record<string, unknown>> = part.values;
  const size = field && values[field.name];
  if (!field || typeof size !== 'number') return { value: '', preciseValue: '', size: 0 };
  const { unit } = field.quantity;
  return { value: formatValue(size, unit), preciseValue: formatValue(size, unit, 4), size };
}

/** A net of the sheet, with its voltage where the circuit is solved. */
export type NetRow = {
  readonly name: string;
  readonly voltage: number | undefined;
  /** Its terminals as `Q1.drain`, those of symbols without a reference left out. */
  readonly terminals: readonly string[];
  /** The part to show for it. */
  readonly part: DrawnComponent | undefined;
};

export function netRows(drawing: Drawing, nets: DrawnNets, solution: Solution | undefined): NetRow[] {
  const components = new Map(drawing.parts.filter(isComponent).map((part) => [part.id, part]));
  const rows = [...nets.nets.values()].map(({ name, terminals }): NetRow => {
    const ends = terminals
      .flatMap(({ part: id, pin }) => {
        const part = components.get(id);
        return part && nets.netOf.has(terminalKey({ part: id, pin })) ? [{ part, pin }] : [];
      })
      .sort((a, b) => byReference(a.part.ref, b.part.ref));
    return {
      name,
      voltage: solution && own(solution.nets, name),
      terminals: ends.map(({ part, pin }) => `${part.ref}.${pin}`),
      part: ends[0]?.part,
    };
  });
  return rows.sort((a, b) => (a.name < b.name ? -1 : 1));
}

function own<T>(record: Readonly<Record<string, T>>, name: string): T | undefined {
  return Object.hasOwn(record, name) ? record[name] : undefined;
}
