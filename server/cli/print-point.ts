import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { formatValue } from '#shared/units/format-value';

/** A record as tables for people. */
export function printPoint(file: string, record: OperatingPointRecord): string {
  const headline =
    record.status === 'solved'
      ? `${file}: solved in ${record.iterations} iterations, currents balance to ${formatValue(record.residual, 'A')}`
      : `${file}: ${record.status}`;
  const blocks = [
    headline,
    fetTable(record),
    table(
      ['net', 'voltage'],
      Object.entries(record.nets).map(([net, voltage]) => [net, formatValue(voltage, 'V', 4)]),
    ),
    elementTable('source', record.sources),
    elementTable('resistor', record.resistors),
    record.problems.map(({ severity, code, message }) => `${severity} ${code}: ${message}`).join('\n'),
  ];
  return `${blocks.filter((block) => block !== '').join('\n\n')}\n`;
}

function fetTable({ fets }: OperatingPointRecord): string {
  const rows = Object.entries(fets).map(([ref, point]) => [
    ref,
    point.reversed ? `${point.region}, reversed` : point.region,
    formatValue(point.id, 'A'),
    formatValue(point.vgs, 'V'),
    formatValue(point.vds, 'V'),
    formatValue(point.vsb, 'V'),
    formatValue(point.vt, 'V'),
    formatValue(point.vov, 'V'),
    formatValue(point.saturationMargin, 'V'),
    formatValue(point.gm, 'S'),
    formatValue(point.gds, 'S'),
    formatValue(point.power, 'W'),
  ]);
  return table(['FET', 'region', 'ID', 'VGS', 'VDS', 'VSB', 'Vt', 'VOV', 'margin', 'gm', 'gds', 'power'], rows);
}

function elementTable(
  title: string,
  elements: Readonly<Record<string, { voltage: number; current: number; power: number }>>,
): string {
  const rows = Object.entries(elements).map(([ref, { voltage, current, power }]) => [
    ref,
    formatValue(voltage, 'V', 4),
    formatValue(current, 'A'),
    formatValue(power, 'W'),
  ]);
  return table([title, 'voltage', 'current', 'power'], rows);
}

/** Columns two spaces apart: words to the left, figures to the right. Nothing when there is no row. */
function table(head: readonly string[], rows: readonly (readonly string[])[]): string {
  if (rows.length === 0) return '';
  const lines = [head, ...rows];
  const widths = head.map((_, column) => Math.max(...lines.map((line) => (line[column] ?? '').length)));
  const isFigure = head.map((_, column) => rows.every((row) => /^[−-]?\d/.test(row[column] ?? '')));
  return lines
    .map((line) =>
      line
        .map((cell, column) =>
          isFigure[column] ? cell.padStart(widths[column] ?? 0) : cell.padEnd(widths[column] ?? 0),
        )
        .join('  ')
        .trimEnd(),
    )
    .join('\n');
}
